export const words = {
  title: 'Settings',
  subtitle: 'Kept in this browser.',
  own: 'Own ways of working',
  theme: 'Theme',
  themes: { device: 'As the device', light: 'Light', dark: 'Dark' },
  letters: 'Letter keys',
  lettersChoices: { on: 'On: B is blank', alt: 'With Alt: Alt and B is blank', off: 'Off' },
  lettersHelp: 'Letters act only while the field is empty.',
  actions: 'Action keys of the desk on a phone',
  sides: { right: 'At the right', left: 'At the left' },
  sessions: 'Sessions',
  signedInAs: (name: string) => `Signed in as ${name}.`,
  here: 'Sign out here',
  everywhere: 'Sign out everywhere',
  everywhereText: 'Every browser and device you are signed in on has to sign in again. Readings kept on a device stay there and go after the next sign-in.',
  everywhereTitle: 'Sign out everywhere?',
  stay: 'Stay signed in',
  licences: 'Licences',
  fonts: 'Meniscus ships these fonts, each under the SIL Open Font License 1.1.',
  version: (version: string) => `Version ${version}`,
} as const;

export const fonts = [
  { name: 'Atkinson Hyperlegible Next', by: 'Copyright 2020 to 2024 The Atkinson Hyperlegible Next Project Authors' },
  { name: 'Atkinson Hyperlegible Mono', by: 'Copyright 2020 to 2024 The Atkinson Hyperlegible Mono Project Authors' },
  { name: 'STIX Two Text', by: 'Copyright 2001 to 2021 The STIX Fonts Project Authors' },
] as const;
