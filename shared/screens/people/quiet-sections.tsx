import type { PeopleAndPaper } from '../../contracts/people-and-paper';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { momentText } from '../times';
import { Row, Section } from './section';
import { words } from './words';

const shownAtOnce = 12;

interface QuietProps {
  readonly view: PeopleAndPaper;
  readonly canAct: boolean;
  readonly onAttendance: (candidateId: string, to: 'absent' | 'present') => void;
  readonly onByHand: (candidateId: string, number: string) => void;
}

/** What is missing or unexpected, what is typed by hand, and the trace. */
export function QuietSections({ view, canAct, onAttendance, onByHand }: QuietProps) {
  const { missing, without, unexpected, unwritten, byHand, traces } = view;
  return (
    <>
      <Section head={words.unexpected.head} count={unexpected.length}>
        {unexpected.map(({ scriptId, candidateId, candidateNumber, attendance }) => (
          <Row key={scriptId} acts={canAct && candidateId ? <Button isSmall onPress={() => onAttendance(candidateId, 'present')}>{words.unexpected.present}</Button> : null}>
            <Text>{words.unexpected.of(candidateNumber ?? '', words.attendances[attendance] ?? attendance)}</Text>
          </Row>
        ))}
      </Section>
      <Section head={words.missing.head} count={missing.length}>
        {missing.map(({ scriptId, candidateNumber, pageNos }) => (
          <Row key={scriptId}>
            <Text isTabular>{words.missing.of(candidateNumber ?? '', pageNos)}</Text>
          </Row>
        ))}
      </Section>
      <Section head={words.without.head} count={without.length}>
        {without.slice(0, shownAtOnce).map(({ candidateId, candidateNumber }) => (
          <Row
            key={candidateId}
            testID={`without-${candidateNumber}`}
            acts={
              canAct ? (
                <>
                  <Button isSmall label={`${words.without.absent}: ${candidateNumber}`} onPress={() => onAttendance(candidateId, 'absent')}>
                    {words.without.absent}
                  </Button>
                  <Button isSmall kind="text" label={`${words.without.byHand}: ${candidateNumber}`} onPress={() => onByHand(candidateId, candidateNumber)}>
                    {words.without.byHand}
                  </Button>
                </>
              ) : null
            }
          >
            <Text variant="reading">{candidateNumber}</Text>
          </Row>
        ))}
        {without.length > shownAtOnce ? (
          <Row>
            <Text tone="ink2">{words.without.more(without.length - shownAtOnce)}</Text>
          </Row>
        ) : null}
      </Section>
      <Section head={words.unwritten.head} count={unwritten.length}>
        {unwritten.map(({ scriptId, candidateNumber }) => (
          <Row key={scriptId}>
            <Text variant="reading">{candidateNumber ?? ''}</Text>
          </Row>
        ))}
      </Section>
      <Section head={words.byHand.head} count={byHand.length}>
        {byHand.map(({ scriptId, candidateNumber, typed, wanted }) => (
          <Row key={scriptId}>
            <Text isTabular>{words.byHand.of(candidateNumber, typed, wanted)}</Text>
          </Row>
        ))}
      </Section>
      <Section head={words.traces.head} count={traces.length}>
        {traces.map(({ at, scriptNumber, was, candidateNumber, reason }, index) => (
          <Row key={`${at}-${scriptNumber}-${index}`}>
            <Text isTabular>{words.traces.bound(scriptNumber, was, candidateNumber)}</Text>
            <Text variant="small" tone="ink2">
              {`${momentText(at)}. ${reason}`}
            </Text>
          </Row>
        ))}
      </Section>
    </>
  );
}
