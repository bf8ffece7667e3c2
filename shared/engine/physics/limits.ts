/** Sizes that school and first-degree apparatus reach; coherent SI. */
interface PlausibleRange {
  role: string;
  least: number;
  greatest: number;
  /** Finishes "is 3 T; …". */
  words: string;
  source: string;
}

const COMMON = 'common practice';

/** Plausible sizes by role. They are wide on purpose: they catch lost prefixes, not taste. */
export const PLAUSIBLE_RANGES: readonly PlausibleRange[] = [
  {
    role: 'acceleratingPd',
    least: 1,
    greatest: 2e7,
    words: 'guns and tubes work from a few volts to some megavolts',
    source: COMMON,
  },
  {
    role: 'platePd',
    least: 0.1,
    greatest: 1e5,
    words: 'deflecting plates take from a volt to some tens of kilovolts',
    source: COMMON,
  },
  {
    role: 'balancePd',
    least: 1,
    greatest: 2e4,
    words: 'oil-drop chambers take from some volts to some kilovolts',
    source: COMMON,
  },
  {
    role: 'plateSeparation',
    least: 1e-4,
    greatest: 1,
    words: 'plates stand from a tenth of a millimetre to a metre apart',
    source: COMMON,
  },
  {
    role: 'plateLength',
    least: 1e-3,
    greatest: 2,
    words: 'plates are from a millimetre to two metres long',
    source: COMMON,
  },
  {
    role: 'fluxDensity',
    least: 1e-6,
    greatest: 20,
    words: 'laboratory magnets give from microteslas to about 20 T',
    source: COMMON,
  },
  {
    role: 'orbitRadius',
    least: 1e-6,
    greatest: 1e4,
    words: 'paths in laboratory fields have radii from micrometres up',
    source: COMMON,
  },
  {
    role: 'dropRadius',
    least: 1e-8,
    greatest: 5e-3,
    words: 'drops and balls have radii from some tens of nanometres to millimetres',
    source: COMMON,
  },
  {
    role: 'dropDensity',
    least: 100,
    greatest: 2.3e4,
    words: 'liquids and solids lie between 100 and 23 000 kg m⁻³',
    source: 'densities of the elements; handbooks',
  },
  { role: 'viscosity', least: 5e-6, greatest: 1e4, words: 'gases start near 10⁻⁵ Pa s', source: 'handbooks' },
  {
    role: 'workFunction',
    least: 1.6e-19,
    greatest: 1.12e-18,
    words: 'work functions of metals lie between 1 and 7 eV',
    source:
      'OpenStax University Physics vol. 3, module m58762 lists 2.46 to 6.35 eV; caesium about 2 eV from memory',
  },
  {
    role: 'planeSpacing',
    least: 5e-11,
    greatest: 5e-9,
    words: 'planes of atoms stand some tenths of a nanometre apart',
    source: 'crystallographic tables',
  },
  {
    role: 'wavelength',
    least: 1e-14,
    greatest: 1e4,
    words: 'radiation used in such questions has wavelengths from femtometres to kilometres',
    source: COMMON,
  },
  {
    role: 'temperature',
    least: 1e-3,
    greatest: 1e8,
    words: 'temperatures run from millikelvins up',
    source: COMMON,
  },
];
