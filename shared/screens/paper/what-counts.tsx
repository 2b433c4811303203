import { View } from 'react-native';
import { Text } from '../../ui/text';
import { Alternatives } from './alternatives';
import type { FieldsProps } from './asked-fields';
import { CodePolicies } from './code-policies';
import { CountRow } from './count-row';
import { sharesOf } from './draft-changes';
import { FollowThrough, type ChainContext } from './follow-through';
import { ToleranceGuard, Untold } from './guard-notes';
import { MethodMarks } from './method-marks';
import { NamedSlips } from './named-slips';
import { PaperCosts } from './paper-costs';
import { PartMarks } from './part-marks';
import { RuleHead } from './rule-head';
import { Bands, RoundingRow } from './value-rules';
import { words } from './words';

/** Every rule that pays or costs marks; and what becomes of an answer without a value. */
export function WhatCounts(props: FieldsProps & ChainContext) {
  const { draft, worked } = props;
  const isNumeric = draft.kind === 'numeric';
  const grains = sharesOf(draft, worked.maxGrains)?.value ?? null;
  const valueGrains = grains !== null && grains > 0 ? grains : null;
  return (
    <View style={{ gap: 4 }}>
      <RuleHead title={words.counts.title} aside={words.counts.aside} />
      <KeyRow {...props} grains={valueGrains} />
      {isNumeric ? (
        <>
          <RoundingRow {...props} grains={valueGrains} />
          <Untold untold={worked.untold} />
          <Bands {...props} />
          <ToleranceGuard guard={worked.guard} />
        </>
      ) : (
        <PartMarks {...props} />
      )}
      <Alternatives {...props} />
      <FollowThrough {...props} />
      {isNumeric ? <NamedSlips {...props} /> : null}
      <MethodMarks {...props} />
      <PaperCosts {...props} />
      <CodePolicies {...props} />
    </View>
  );
}

function KeyRow({ draft, worked, grains }: FieldsProps & { readonly grains: number | null }) {
  return (
    <CountRow value={worked.key?.text ?? ''} grains={grains} maxGrains={worked.maxGrains}>
      {draft.kind === 'numeric' ? (
        <Text>
          <Text weight={600}>{words.counts.key}</Text>
          {words.counts.keyWith(worked.key?.decimals ?? draft.decimals, worked.key?.figures ?? null)}
        </Text>
      ) : (
        <Text weight={600}>{words.answerCounts[draft.kind]}</Text>
      )}
    </CountRow>
  );
}
