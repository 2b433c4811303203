/** The words of beginning a sitting. */
export const words = {
  title: 'New sitting',
  course: 'Course',
  paperTitle: 'Title',
  titleHelp: 'As it should stand on screens and sheets, such as “Paper 2, spring sitting”.',
  heldOn: 'Date',
  heldOnHelp: 'Year, month, day: 2026-05-06.',
  second: 'Second readings',
  seconds: { none: 'none: each answer is read once', all: 'all: each answer is read by two people' },
  make: 'Begin the sitting',
  cancel: 'Cancel',
  needsTitle: 'Give it a title.',
  needsDate: 'Write a date as 2026-05-06.',
  noCourse: 'You lead no course, so you cannot begin a sitting.',
} as const;
