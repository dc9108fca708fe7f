/** The invented people of the demonstration. Their passphrases are told on the sign-in screen while it is loaded. */
import type { Role } from '#shared/contracts/session.ts';

export interface DemoPerson {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly passphrase: string;
  readonly team: 'tern-rock' | 'gannet-bank';
  readonly role: Role;
}

export const DEMO_PEOPLE: readonly DemoPerson[] = [
  {
    id: 'demo-ines',
    name: 'Ines Farrow',
    email: 'ines.farrow@skerry.example',
    passphrase: 'tern rock tide table',
    team: 'tern-rock',
    role: 'captain',
  },
  {
    id: 'demo-kasimir',
    name: 'Kasimir Lund',
    email: 'kasimir.lund@skerry.example',
    passphrase: 'brass ruler and level',
    team: 'tern-rock',
    role: 'member',
  },
  {
    id: 'demo-maren',
    name: 'Maren Tove',
    email: 'maren.tove@skerry.example',
    passphrase: 'paper cups from above',
    team: 'tern-rock',
    role: 'member',
  },
  {
    id: 'demo-petra',
    name: 'Petra Abiola',
    email: 'petra.abiola@skerry.example',
    passphrase: 'slow bubble in the oil',
    team: 'tern-rock',
    role: 'member',
  },
  {
    id: 'demo-odile',
    name: 'Odile Marsk',
    email: 'odile.marsk@skerry.example',
    passphrase: 'ask where the jet breaks',
    team: 'tern-rock',
    role: 'advisor',
  },
  {
    id: 'demo-sunniva',
    name: 'Sunniva Dahl',
    email: 'sunniva.dahl@gannet.example',
    passphrase: 'north wind at the pier',
    team: 'gannet-bank',
    role: 'captain',
  },
];
