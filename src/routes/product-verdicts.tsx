import { Sheet } from '#src/ui/sheet.tsx';

export function Component() {
  return <div className="wrap full"><Sheet className="hung"><div className="panel" /></Sheet></div>;
}
