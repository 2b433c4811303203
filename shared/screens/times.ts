/** `10:42`, on the clock of this device. */
export const clockTime = (at: number): string => new Date(at).toLocaleTimeString('en-GB', { hour: '2-digit', minute: '2-digit' });

/** `6 May 2026, 10:42`. */
export const momentText = (at: number): string => `${new Date(at).toLocaleDateString('en-GB', { day: 'numeric', month: 'long', year: 'numeric' })}, ${clockTime(at)}`;

/** `6 May 2026` of a plain date. */
export const dayText = (day: string): string => new Date(`${day}T12:00:00`).toLocaleDateString('en-GB', { day: 'numeric', month: 'long', year: 'numeric' });
