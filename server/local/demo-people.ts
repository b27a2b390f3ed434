import type { Role } from '#shared/contracts/session.contract.ts';

/** Invented people of invented houses: seeded as members, and known to the built-in identity service. */
export interface DemoPerson {
  /** The person's id in the database and their subject at the built-in identity service. */
  readonly id: string;
  readonly name: string;
  readonly email: string;
  /** What they do, in plain words, for the list at sign-in. */
  readonly work: string;
  readonly houseId: string;
  readonly roles: readonly Role[];
  /** For the built-in identity service only, where it is no secret. */
  readonly password: string;
}

export interface DemoHouse {
  readonly id: string;
  readonly name: string;
}

export const BRACKENMERE: DemoHouse = { id: '5d0c1b7e-6f0a-4c52-9a3e-2b8f4e7d1a01', name: 'Brackenmere Bathhouse' };
export const OTTERBY: DemoHouse = { id: '5d0c1b7e-6f0a-4c52-9a3e-2b8f4e7d1a02', name: 'Otterby Still Room' };
export const DEMO_HOUSES: readonly DemoHouse[] = [BRACKENMERE, OTTERBY];

const at = (house: DemoHouse, password: string) => ({ houseId: house.id, password });

export const INES: DemoPerson = { id: '8f2e6c40-1d3b-4e8a-b7c5-90a1d2e3f401', name: 'Ines Tarrow', email: 'ines@brackenmere.example', work: 'Formulator', roles: ['formulator'], ...at(BRACKENMERE, 'brackenmere') };
export const MAUD: DemoPerson = { id: '8f2e6c40-1d3b-4e8a-b7c5-90a1d2e3f402', name: 'Maud Pellow', email: 'maud@brackenmere.example', work: 'Owner and formulator', roles: ['owner', 'formulator'], ...at(BRACKENMERE, 'brackenmere') };
export const ODILE: DemoPerson = { id: '8f2e6c40-1d3b-4e8a-b7c5-90a1d2e3f403', name: 'Dr Odile Marsh', email: 'odile@brackenmere.example', work: 'Safety assessor', roles: ['assessor'], ...at(BRACKENMERE, 'brackenmere') };
export const PIET: DemoPerson = { id: '8f2e6c40-1d3b-4e8a-b7c5-90a1d2e3f404', name: 'Piet Lund', email: 'piet@brackenmere.example', work: 'Artworker', roles: ['artworker'], ...at(BRACKENMERE, 'brackenmere') };
export const RHEA: DemoPerson = { id: '8f2e6c40-1d3b-4e8a-b7c5-90a1d2e3f405', name: 'Rhea Colby', email: 'rhea@brackenmere.example', work: 'Seller', roles: ['seller'], ...at(BRACKENMERE, 'brackenmere') };
export const BRAM: DemoPerson = { id: '8f2e6c40-1d3b-4e8a-b7c5-90a1d2e3f406', name: 'Bram Otter', email: 'bram@otterby.example', work: 'Owner', roles: ['owner'], ...at(OTTERBY, 'otterby') };

export const DEMO_PEOPLE: readonly DemoPerson[] = [INES, MAUD, ODILE, PIET, RHEA, BRAM];

/** Known to the built-in identity service and member of no house: shows what a newcomer meets. Not seeded. */
export const NEWCOMER = { id: '8f2e6c40-1d3b-4e8a-b7c5-90a1d2e3f407', name: 'Wilf Aske', email: 'wilf@newcomer.example', work: 'No house yet', password: 'newcomer' } as const;
