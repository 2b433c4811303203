import { expect, it, vi } from 'vitest';
import { inTransaction, openDatabase } from './client';
import { committedTogether } from './group-commit';

function open() {
  const db = openDatabase(':memory:');
  db.$client.exec('create table act (name text primary key)');
  const insert = db.$client.prepare('insert into act values (?)');
  const names = () => db.$client.prepare('select name from act order by name').pluck().all();
  return { db, names, act: (name: string) => () => void insert.run(name) };
}

it('acts of one turn share one commit, and none is answered before it', async () => {
  const { db, names, act } = open();
  const begin = db.$client.transaction.bind(db.$client);
  const begun = vi.fn();
  vi.spyOn(db.$client, 'transaction').mockImplementation(((work: () => unknown) => {
    // What begins inside another is a savepoint and commits nothing.
    if (!db.$client.inTransaction) begun();
    return begin(work);
  }) as never);
  const answered: string[] = [];
  const all = Promise.all(['a', 'b', 'c'].map((name) => committedTogether(db, act(name)).then(() => answered.push(name))));
  expect([answered, names()]).toEqual([[], []]);
  await all;
  expect([answered, names()]).toEqual([['a', 'b', 'c'], ['a', 'b', 'c']]);
  expect(begun).toHaveBeenCalledTimes(1);
});

it('a refused act changes nothing of the others, and gets its own error', async () => {
  const { db, names, act } = open();
  const refused = () => {
    act('half')();
    throw new Error('No.');
  };
  const outcomes = await Promise.allSettled([committedTogether(db, act('a')), committedTogether(db, refused), committedTogether(db, act('b'))]);
  expect(outcomes.map(({ status }) => status)).toEqual(['fulfilled', 'rejected', 'fulfilled']);
  expect(names()).toEqual(['a', 'b']);
});

it('when the commit fails, no act of the group is answered as done', async () => {
  const { db, names, act } = open();
  db.$client.exec('pragma foreign_keys = on; create table child (parent text references act(name) deferrable initially deferred)');
  const orphan = () => void db.$client.prepare('insert into child values (?)').run('nobody');
  const outcomes = await Promise.allSettled([committedTogether(db, act('a')), committedTogether(db, orphan)]);
  expect(outcomes.map(({ status }) => status)).toEqual(['rejected', 'rejected']);
  expect(names()).toEqual([]);
  await committedTogether(db, act('later'));
  expect(names()).toEqual(['later']);
});

it('when one act ends the whole transaction, as a full disk does, no act of the group is answered or kept', async () => {
  const { db, names, act } = open();
  act('old')();
  const ending = () => void db.$client.exec("insert or rollback into act values ('old')");
  const outcomes = await Promise.allSettled([committedTogether(db, act('a')), committedTogether(db, ending), committedTogether(db, act('b'))]);
  expect(outcomes.map(({ status }) => status)).toEqual(['rejected', 'rejected', 'rejected']);
  expect(names()).toEqual(['old']);
});

it('gives back what the work gives back, and waits for another turn when one has begun', async () => {
  const { db, act } = open();
  expect(await committedTogether(db, () => 7)).toBe(7);
  inTransaction(db, act('alone'));
  await expect(committedTogether(db, act('alone'))).rejects.toThrow('UNIQUE');
});
