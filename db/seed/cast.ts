import type { MembershipRole } from '../../shared/contracts/enums';

interface CastMember {
  readonly name: string;
  readonly email: string;
  readonly isOfficer?: true;
  /** Roles in the course of the demo; the outsider's are in another course. */
  readonly roles: readonly MembershipRole[];
  readonly elsewhere?: readonly MembershipRole[];
}

/** The named cast of tests, seed and demo. All invented. */
export const cast = {
  lead: { name: 'Ines Hallward', email: 'lead@wrenmoor.example', roles: ['lead'] },
  readerOne: { name: 'Tomas Okell', email: 'reader1@wrenmoor.example', roles: ['reader'] },
  readerTwo: { name: 'Priya Lindqvist', email: 'reader2@wrenmoor.example', roles: ['reader'] },
  officer: { name: 'Marta Venn', email: 'officer@wrenmoor.example', isOfficer: true, roles: [] },
  external: { name: 'Daniel Ashgrove', email: 'external@wrenmoor.example', roles: ['external'] },
  candidate: { name: 'Robin Calloway', email: 'candidate@wrenmoor.example', roles: [] },
  outsider: { name: 'Vera Stannard', email: 'outsider@wrenmoor.example', roles: [], elsewhere: ['lead', 'reader'] },
} as const satisfies Record<string, CastMember>;

export type CastName = keyof typeof cast;

/** Of the demo and the tests only: a real installation sets passwords by invitation. */
export const castPassword = 'copper-and-iodine';
