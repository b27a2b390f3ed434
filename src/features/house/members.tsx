import type { House } from '#shared/contracts/house.contract.ts';
import type { Role } from '#shared/contracts/session.contract.ts';
import { Panel } from '#src/ui/sheet.tsx';

const ROLES: Readonly<Record<Role, string>> = { owner: 'owner', formulator: 'formulator', assessor: 'safety assessor', artworker: 'artworker', seller: 'seller' };

/** Who is of the house, and what each may do. */
export function Members({ members }: { members: House['members'] }) {
  return (
    <Panel title="Members" aside="one person may hold several roles">
      <div className="table-scroll">
        <table className="table" aria-label="Members">
          <thead><tr><th scope="col">Name</th><th scope="col">E-mail</th><th scope="col">Roles</th></tr></thead>
          <tbody>
            {members.map((member) => (
              <tr key={member.personId}><td className="font-semibold">{member.name}</td><td>{member.email}</td><td>{member.roles.map((role) => ROLES[role]).join(', ')}</td></tr>
            ))}
          </tbody>
        </table>
      </div>
      <p className="hint mt-3 max-w-[75ch]">Owners change the house; owners and formulators change materials, products and labels; artworkers change labels; assessors and sellers read.</p>
    </Panel>
  );
}
