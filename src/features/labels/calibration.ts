import { useSyncExternalStore } from 'react';

/** A bank card, ISO/IEC 7810 ID-1, in millimetres. */
export const CARD = { width: 85.6, height: 53.98 } as const;
/** What every browser promises before anyone has measured: 96 pixels to the inch. */
const NOMINAL = 96 / 25.4;
const KEY = 'colophon.screen';
const LEAST = 1.5;
const MOST = 16;

export interface Calibration {
  readonly pixelsPerMm: number;
  /** Day of the check, `YYYY-MM-DD`; empty where the screen was never measured. */
  readonly on: string;
}
const UNMEASURED: Calibration = { pixelsPerMm: NOMINAL, on: '' };

const listeners = new Set<() => void>();
let current: Calibration | null = null;

function read(): Calibration {
  try {
    const stored: unknown = JSON.parse(localStorage.getItem(KEY) ?? 'null');
    if (stored && typeof stored === 'object' && 'pixelsPerMm' in stored && 'on' in stored) {
      const { pixelsPerMm, on } = stored;
      if (typeof pixelsPerMm === 'number' && pixelsPerMm >= LEAST && pixelsPerMm <= MOST && typeof on === 'string') return { pixelsPerMm, on };
    }
  } catch {
    // A device that stores nothing shows the nominal size.
  }
  return UNMEASURED;
}

/** Keeps the measured scale of this device. */
export function keepCalibration(calibration: Calibration): void {
  current = calibration;
  try {
    localStorage.setItem(KEY, JSON.stringify(calibration));
  } catch {
    // Kept for this visit at least.
  }
  listeners.forEach((listener) => listener());
}

/** Pixels per millimetre of this screen, once for the device. */
export function useCalibration(): Calibration {
  return useSyncExternalStore(
    (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    () => (current ??= read()),
    () => UNMEASURED,
  );
}
