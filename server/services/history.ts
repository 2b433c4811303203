import { readingsEver, rulingsEver, scoresEver } from '../../db/queries/answers';
import { uncoveredBy } from '../../db/queries/ledger';
import type { HistoryAct } from '../../shared/contracts/ledger';
import { struckIds } from '../../shared/marking/struck';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { pseudonyms, requireAnswer } from './answers';
import { isCovered, shownGiven } from './covers';

const plain = { given: null, method: [] as string[], isCovered: false, grains: null, reason: null, schemeOrdinal: null };

/** What happened to one answer, oldest first. Covered readings are covered here as well. */
export function answerHistory(context: Context, actor: Actor, answerId: string): HistoryAct[] {
  const { db } = context;
  const { head } = requireAnswer(context, actor, answerId, ['lead', 'external']);
  const covered = isCovered(head.state, head.readingsDue, uncoveredBy(db, actor.personId, [answerId]).has(answerId));
  const nameOf = pseudonyms(context, head.sitting);
  const acts: HistoryAct[] = [];
  for (const { reading, reading_end: end } of readingsEver(db, answerId)) {
    // A lead's third reading is what uncovers; another lead's stays as covered as the pair.
    const isKeptBack = covered && !(reading.purpose === 'third' && reading.reader === actor.personId);
    const given = shownGiven(reading, head.state, isKeptBack);
    const who = reading.purpose === 'third' ? 'lead' : nameOf(reading.reader);
    acts.push({ ...plain, at: reading.recordedAt, who, act: reading.purpose === 'third' ? 'read-again' : 'read', given, method: isKeptBack ? [] : struckIds(reading.method), isCovered: isKeptBack && given === null });
    if (end) acts.push({ ...plain, at: end.at, who: nameOf(end.by), act: end.why === 'surplus' ? 'surplus' : 'taken-back' });
  }
  for (const { ruling, ruling_end: end } of rulingsEver(db, answerId)) {
    // A ruling that was taken back names a reading of a pair that is covered again.
    const given = covered || ruling.kind === 'mark' ? null : { text: ruling.text, code: ruling.code };
    acts.push({ ...plain, at: ruling.at, who: 'lead', act: 'ruled', given, method: given === null ? [] : struckIds(ruling.method), isCovered: covered, grains: covered ? null : ruling.grains, reason: covered ? null : ruling.reason });
    if (end) acts.push({ ...plain, at: end.at, who: 'lead', act: 'ruling-ended', reason: end.why === 'replaced' ? 'replaced by another ruling' : 'taken back' });
  }
  for (const score of scoresEver(db, answerId)) {
    acts.push({ ...plain, at: score.at, who: 'the scheme', act: 'scored', isCovered: covered, grains: covered ? null : score.grains, schemeOrdinal: score.ordinal });
  }
  return acts.sort((one, other) => one.at - other.at);
}
