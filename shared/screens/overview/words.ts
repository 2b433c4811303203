export const words = {
  held: (day: string, second: string) => `${day}. ${second}`,
  seconds: { none: 'Every answer is read once.', all: 'Every answer is read twice, by two people.' },
  pages: 'pages in',
  pagesIn: (of: number) => `of ${of.toLocaleString('en-GB')} pages in`,
  readings: 'readings taken',
  readingsTaken: (of: number) => `of ${of.toLocaleString('en-GB')} readings taken, of the pages that are in`,
  heldAnswers: (n: number) => (n === 1 ? 'One answer is held: no mark stands until a ruling.' : `${n.toLocaleString('en-GB')} answers are held: no mark stands until a ruling.`),
  sections: 'Sections of the sitting',
  provisional: 'All marks are provisional until the board of examiners confirms them.',
} as const;
