import { useSearchParams } from 'react-router-dom';
import { SignInSheet } from '#src/features/session/sign-in-sheet.tsx';

export function Component() {
  const [search] = useSearchParams();
  return <SignInSheet to={search.get('to') ?? '/'} />;
}
