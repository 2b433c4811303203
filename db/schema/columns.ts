import { integer, text } from 'drizzle-orm/sqlite-core';

/** UUIDv7 text, made by whoever makes the thing, the device included. */
export const id = () => text().primaryKey();

/** UTC milliseconds from the one clock. */
export const instant = () => integer();

/** A write names the rev it saw; an old one is a conflict. */
export const rev = () => integer().notNull().default(1);
