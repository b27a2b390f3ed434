import { TextButton } from '#src/ui/button.tsx';
import { useToast } from '#src/ui/toast.tsx';

/** Copies a list as it is printed. Where the browser forbids that, it says so. */
export function CopyText({ text, label = 'Copy the text', what = 'The declaration' }: { text: string; label?: string; what?: string }) {
  const toast = useToast();
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(text);
      toast(`${what} is copied.`);
    } catch {
      toast('The browser does not let the text be copied. Mark it and copy it by hand.');
    }
  };
  return <TextButton onClick={() => void copy()} disabled={text === ''}>{label}</TextButton>;
}
