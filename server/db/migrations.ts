import { Houses } from '../../migrations/001-houses.ts';
import { SignIn } from '../../migrations/002-sign-in.ts';

/** Every migration in order: named here, so that nothing has to be searched for when the server is compiled. */
export const MIGRATIONS = [
  { name: '001-houses', class: Houses },
  { name: '002-sign-in', class: SignIn },
];
