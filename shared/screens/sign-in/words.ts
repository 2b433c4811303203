export const words = {
  name: 'Sign in',
  tagline: 'The curve a chemist reads, at eye level.',
  intro: 'For people who mark: leads, readers, external examiners and the exams office.',
  email: 'E-mail',
  password: 'Password',
  submit: 'Sign in',
} as const;
