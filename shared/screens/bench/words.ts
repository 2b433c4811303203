export const words = {
  name: 'Bench',
  institution: 'University of Wrenmoor, School of Chemistry',
  sittings: 'Sittings',
  legend: 'What is left in a burette is what is left to do.',
  newSitting: 'New sitting',
  signOut: 'Sign out',
  none: 'No sitting yet',
  noneForLead: 'Begin one: a paper, its regions, a class list.',
  noneForOthers: 'A sitting appears here once a lead of your course has begun it.',
  open: 'open to change',
  locked: 'locked',
} as const;
