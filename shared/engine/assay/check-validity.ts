import { CONSTANTS } from '../physics/constants.ts';
import { CHARGE, MASS } from '../physics/laws.ts';
import { drawsShow, finding, Tally, type CheckStart } from './check.ts';
import type { AssayPart } from './context.ts';
import { bandsOfBlock } from './part-marking.ts';
import { bindRoles, isBound, roleValue } from './roles-bound.ts';
import type { ItemContent } from '../item/content.ts';

const LIGHT = CONSTANTS.get('c')?.value ?? NaN;
/** Density of dry air at 20 °C and 101.325 kPa, kg/m³ (handbooks; value from memory). */
const AIR_DENSITY = 1.204;
/** Mean free path in air at 20 °C and 101.325 kPa, m (handbooks; value from memory). */
const MEAN_FREE_PATH = 66e-9;

type Values = (role: string) => number;
type Assumption = ItemContent['assumptions'][number];

/** One simplification that items make, and the relative error that it leaves in one role's value. */
interface Model {
  id: string;
  assumption: Assumption;
  /** Roles whose answers it bears upon, with the error it leaves there. */
  affects: Readonly<Record<string, (error: number) => number>>;
  needs: readonly string[];
  error: (value: Values) => number;
  words: string;
  cure: string;
  source: string;
}

/** Cunningham's correction 1 + Kn(1.257 + 0.400 exp(−1.10/Kn)), Kn = mean free path over radius (Davies 1945). */
export function slipCorrection(radius: number): number {
  const knudsen = MEAN_FREE_PATH / radius;
  return 1 + knudsen * (1.257 + 0.4 * Math.exp(-1.1 / knudsen));
}

/** Error of √(2qV/m) as a speed: exact speed from γ = 1 + qV/(mc²) (special relativity). */
export function nonRelativisticSpeedError(kineticOverRest: number): number {
  const gamma = 1 + kineticOverRest;
  const exact = Math.sqrt(1 - 1 / gamma ** 2);
  return Math.sqrt(2 * kineticOverRest) / exact - 1;
}

const MODELS: readonly Model[] = [
  {
    id: 'relativistic',
    assumption: 'nonRelativistic',
    affects: {
      speed: (error) => error,
      momentum: (error) => error,
      deBroglieWavelength: (error) => error / 2,
      specificCharge: (error) => 2 * error,
      ringDiameter: (error) => error / 2,
      orbitRadius: (error) => error / 2,
    },
    needs: ['acceleratingPd', MASS, CHARGE],
    error: (v) => nonRelativisticSpeedError((v(CHARGE) * v('acceleratingPd')) / (v(MASS) * LIGHT ** 2)),
    words: 'The non-relativistic formula',
    cure: 'Lower the accelerating p.d., or state that relativistic effects are left out.',
    source: 'special relativity',
  },
  {
    id: 'slip',
    assumption: 'noSlipCorrection',
    affects: {
      dropRadius: (error) => error / 2,
      weight: (error) => 1.5 * error,
      dropMass: (error) => 1.5 * error,
      viscosity: (error) => error,
      terminalSpeed: (error) => error,
    },
    needs: ['terminalSpeed', 'dropRadius'],
    error: (v) => slipCorrection(v('dropRadius')) - 1,
    words: 'Stokes’ law without the slip correction',
    cure: 'State in the stem that Stokes’ law may be used as it stands, or take larger drops.',
    source: 'Davies 1945',
  },
  {
    id: 'upthrust',
    assumption: 'noUpthrust',
    affects: {
      dropRadius: (error) => error / 2,
      viscosity: (error) => error,
      charge: (error) => error,
      terminalSpeed: (error) => error,
    },
    needs: ['dropDensity'],
    error: (v) => AIR_DENSITY / v('dropDensity'),
    words: 'Leaving out the upthrust of the air',
    cure: 'State in the stem that the upthrust can be left out.',
    source: 'Archimedes’ principle',
  },
  {
    id: 'stokes',
    assumption: 'stokesLaw',
    affects: {
      viscosity: (error) => error,
      dropRadius: (error) => error / 2,
      terminalSpeed: (error) => error,
    },
    needs: ['terminalSpeed', 'dropRadius', 'viscosity'],
    // Oseen's first correction to the drag, 3Re/16 with Re on the diameter.
    error: (v) => (3 / 16) * ((2 * v('dropRadius') * v('terminalSpeed') * AIR_DENSITY) / v('viscosity')),
    words: 'Stokes’ law at this Reynolds number',
    cure: 'Slow the fall, or state that Stokes’ law holds.',
    source: 'Oseen 1910',
  },
];

interface Watched {
  model: Model;
  set: ReturnType<typeof bindRoles>[number];
  part: AssayPart;
  effect: (error: number) => number;
  tally: Tally;
  worstError: number;
  worstShare: number;
}

/** 4. The error of each simplification, compared with the band of the answers it bears upon. */
export const checkValidity: CheckStart = (context) => {
  const roles = new Map(context.content.quantities.map((quantity) => [quantity.name, quantity]));
  const watched: Watched[] = bindRoles(context).flatMap((set) =>
    MODELS.filter((model) => model.needs.every((role) => isBound(set, role))).flatMap((model) =>
      context.parts.flatMap((part): Watched[] => {
        const own = roles.get(part.info.name);
        const effect = own?.role == null || own.set !== set.set ? undefined : model.affects[own.role];
        if (effect === undefined) return [];
        return [{ model, set, part, effect, tally: new Tally(), worstError: 0, worstShare: 0 }];
      }),
    ),
  );
  return {
    visit: (block) => {
      for (const entry of watched) {
        const bands = bandsOfBlock(entry.part, block);
        if (bands === null) continue;
        for (let index = 0; index < block.draws.length; index += 1) {
          if (block.kept[index] === 0) continue;
          const error = Math.abs(entry.effect(entry.model.error(roleValue(entry.set, block.columns, index))));
          const answer = Math.abs(bands.answers[index] ?? NaN);
          const half = ((bands.to[index] ?? NaN) - (bands.from[index] ?? NaN)) / 2 / answer;
          const share = half > 0 ? error / half : Infinity;
          if (!(share > 1 / 3)) continue;
          entry.tally.add(block.draws[index] ?? 0, share);
          if (share > entry.worstShare) {
            entry.worstShare = share;
            entry.worstError = error;
          }
        }
      }
    },
    finish: () =>
      watched
        .filter(({ tally }) => tally.count > 0)
        .map(({ model, part, tally, worstError, worstShare, set }) => {
          const stated = context.content.assumptions.includes(model.assumption);
          const code = stated
            ? 'model-error-stated'
            : worstShare > 1
              ? 'model-error-over-band'
              : 'model-error-near-band';
          return finding(code, {
            about: `${model.id}:${part.part.id}:${set.set}`,
            statement: `${model.words} is ${(worstError * 100).toPrecision(2)} % out in the answer to part (${part.letter}) on draw ${tally.worstDraw}, ${worstShare > 1 ? 'more than the whole band' : 'over a third of the band'}; ${drawsShow(tally.count)}.`,
            cure: stated ? 'The item states this simplification.' : model.cure,
            place: { partId: part.part.id },
            tally,
          });
        }),
  };
};
