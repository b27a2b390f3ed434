import { useState } from 'react';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { CARD, keepCalibration, type Calibration } from './calibration.ts';

/** Holds a bank card against the screen: the drawn card is made to match, once for the device. */
export function CalibrationDialog({ isOpen, onClose, calibration }: { isOpen: boolean; onClose: () => void; calibration: Calibration }) {
  const [scale, setScale] = useState(calibration.pixelsPerMm);
  const keep = (): void => {
    const now = new Date();
    const on = `${now.getFullYear()}-${String(now.getMonth() + 1).padStart(2, '0')}-${String(now.getDate()).padStart(2, '0')}`;
    keepCalibration({ pixelsPerMm: scale, on });
    onClose();
  };
  return (
    <Dialog
      title="Check this screen with a bank card" isOpen={isOpen} onClose={onClose} size="wide"
      foot={<><Button onClick={onClose}>Leave it</Button><Button weight="act" onClick={keep}>Keep this size</Button></>}
    >
      <p>Lay any bank card on the drawn one, corner to corner. Move the slider until both are the same width. Labels are then shown at true size on this device.</p>
      <div className="card-room">
        <svg width={CARD.width * scale} height={CARD.height * scale} viewBox={`0 0 ${CARD.width} ${CARD.height}`} role="img" aria-label="A card to match">
          <rect x=".2" y=".2" width={CARD.width - 0.4} height={CARD.height - 0.4} rx="3.2" fill="var(--tray)" stroke="var(--edge)" strokeWidth=".4" />
          <path d={`M0 ${CARD.height / 2}H8M${CARD.width - 8} ${CARD.height / 2}H${CARD.width}`} stroke="var(--edge)" strokeWidth=".4" />
          <text x={CARD.width / 2} y={CARD.height / 2 + 1.4} textAnchor="middle" fontSize="4" fill="var(--ink-2)">85.6 mm</text>
        </svg>
      </div>
      <label className="turn">
        <span className="quiet">Width</span>
        <input type="range" min={2.4} max={9} step={0.01} value={scale} onChange={(event) => setScale(Number(event.target.value))} aria-label="Width of the drawn card" />
      </label>
    </Dialog>
  );
}
