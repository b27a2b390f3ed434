import { Houses } from '../../migrations/001-houses.ts';
import { SignIn } from '../../migrations/002-sign-in.ts';
import { DictionaryTables } from '../../migrations/003-dictionary.ts';
import { ClaimEvidence } from '../../migrations/004-claim-evidence.ts';
import { Inventory } from '../../migrations/006-inventory.ts';
import { MaterialFacts } from '../../migrations/007-material-facts.ts';
import { Pictures } from '../../migrations/009-pictures.ts';
import { Trail } from '../../migrations/010-trail.ts';

/** Every migration in order: named here, so that nothing has to be searched for when the server is compiled. */
export const MIGRATIONS = [
  { name: '001-houses', class: Houses },
  { name: '002-sign-in', class: SignIn },
  { name: '003-dictionary', class: DictionaryTables },
  { name: '004-claim-evidence', class: ClaimEvidence },
  { name: '006-inventory', class: Inventory },
  { name: '007-material-facts', class: MaterialFacts },
  { name: '009-pictures', class: Pictures },
  { name: '010-trail', class: Trail },
];
