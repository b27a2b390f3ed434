import { Link, NavLink } from 'react-router-dom';
import type { Session } from '#shared/contracts/session.contract.ts';
import { useSignOut, useSwitchHouse } from '#src/features/session/mutations.ts';
import { Disclosure } from '#src/ui/disclosure.tsx';
import { Icon } from '#src/ui/icon.tsx';
import { paths, rooms } from './paths.ts';

/** The rooms behind one word, where the bar is too narrow for them. */
export function RoomsMenu() {
  return (
    <Disclosure label="Rooms" at="left" className="plain rooms-menu" trigger={<><Icon name="rooms" />Rooms</>}>
      {(close) => (
        <nav aria-label="Rooms">
          {rooms.map((room) => <NavLink key={room.to} to={room.to} end={room.end} onClick={close}>{room.word}</NavLink>)}
        </nav>
      )}
    </Disclosure>
  );
}

/** The house and the person: other houses, addresses and members, signing out. */
export function HouseMenu({ session }: { session: Session }) {
  const signOut = useSignOut();
  const go = useSwitchHouse();
  const others = session.houses.filter((house) => house.id !== session.house.id);
  return (
    <Disclosure label="House and person" at="right" className="plain who" trigger={session.house.name}>
      {(close) => (
        <>
          <p>{session.person.name}, {session.person.email}</p>
          <Link to={paths.house} onClick={close}>Addresses and members</Link>
          <Link to={paths.trail} onClick={close}>Trail</Link>
          {others.map((house) => <button key={house.id} type="button" onClick={() => go.mutate(house.id)}>Go to {house.name}</button>)}
          <hr />
          <button type="button" onClick={() => signOut.mutate()}>Sign out</button>
        </>
      )}
    </Disclosure>
  );
}
