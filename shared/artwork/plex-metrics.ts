import bold from './metrics/plex-700.json' with { type: 'json' };
import light from './metrics/plex-300.json' with { type: 'json' };
import medium from './metrics/plex-500.json' with { type: 'json' };
import regular from './metrics/plex-400.json' with { type: 'json' };
import semibold from './metrics/plex-600.json' with { type: 'json' };
import versals from './metrics/versals.json' with { type: 'json' };
import { faceOf, type FontMetrics } from './metrics.ts';

const faces = { 300: faceOf(light), 400: faceOf(regular), 500: faceOf(medium), 600: faceOf(semibold), 700: faceOf(bold) } as const;
const outlines: Readonly<Record<string, readonly (string | number)[]>> = versals;

/** The label type, IBM Plex Sans, from the tables that server/artwork/write-metrics.ts writes. */
export const plexMetrics: FontMetrics = {
  face: (weight) => faces[weight],
  versal: (letter) => outlines[letter],
};
