import type { SourceRole } from '../../src/schedule/context';

type Band = readonly [fluxJy: number, sizeMas: number];
type Row = readonly [name: string, raDeg: number, decDeg: number, role: SourceRole, at22: Band, at8: Band];

/**
 * Places: ICRF2, in the public domain (USNO), as in tests/reference/sources.json. Roles, flux densities
 * and sizes are invented.
 */
export const SOURCES: readonly (readonly [...Row, wantedScans: number])[] = [
  ['J0530+1331', 82.7350697775, 13.5319859792, 'finder', [1.3, 0.14], [2.2, 0.31], 4],
  ['J0555+3948', 88.8783567146, 39.8136569351, 'finder', [1.9, 0.16], [3.6, 0.35], 8],
  ['J0738+1742', 114.5308072819, 17.7052772862, 'target', [0.46, 0.22], [0.66, 0.46], 8],
  ['J0751+3313', 117.97363846, 33.2221717559, 'target', [0.24, 0.21], [0.35, 0.44], 12],
  ['J0811+0146', 122.8612804662, 1.7811722949, 'phase-ref', [0.9, 0.15], [1.1, 0.33], 2],
  ['J0825+0309', 126.4597431429, 3.1568111314, 'target', [0.22, 0.22], [0.3, 0.48], 2],
  ['J0827+5217', 126.9737420764, 52.2995266424, 'target', [0.13, 0.21], [0.21, 0.45], 20],
  ['J0854+2006', 133.7036455292, 20.1085113572, 'finder', [1.7, 0.11], [1.9, 0.24], 5],
  ['J0927+3902', 141.7625580534, 39.0391255157, 'finder', [3.1, 0.2], [6.4, 0.42], 9],
  ['J1058+0133', 164.6233550311, 1.5663399359, 'target', [0.74, 0.22], [1.2, 0.47], 5],
  ['J1159+2914', 179.8826412906, 29.245507465, 'target', [0.52, 0.22], [0.8, 0.46], 7],
];

/** In the catalogue alone, around the targets: the first place as above, the others invented to 0.01°. */
export const OTHER_SOURCES: readonly Row[] = [
  ['J1217+3007', 184.4670083, 30.1168433, 'phase-ref', [0.47, 0.18], [0.55, 0.36]],
  ['J1152+3307', 178.1, 33.12, 'phase-ref', [0.19, 0.17], [0.26, 0.35]],
  ['J1146+2452', 176.55, 24.87, 'phase-ref', [0.55, 0.2], [0.61, 0.41]],
];
