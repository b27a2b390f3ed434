/** A name with the part that was typed underlined. */
export function Lit({ text, typed }: { text: string; typed: string }) {
  const at = typed.trim() === '' ? -1 : text.toLowerCase().indexOf(typed.trim().toLowerCase());
  if (at < 0) return <>{text}</>;
  const end = at + typed.trim().length;
  return (
    <>
      {text.slice(0, at)}
      <mark>{text.slice(at, end)}</mark>
      {text.slice(end)}
    </>
  );
}
