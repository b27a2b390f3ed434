export function Palette({ onClose }: { onClose: () => void }) { void onClose; return null; }
