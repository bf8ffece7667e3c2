import type { CompiledScript, DrawValues, ItemContent } from '../engine/index.ts';

/** Every caution ends with this: the product never replaces the people who are responsible. */
export const CAUTION_DEFERENCE = 'Local safety rules and a competent person’s risk assessment come first.';

/** Above this accelerating p.d. a beam that strikes metal makes X-rays worth shielding; common practice. */
const X_RAY_VOLTS = 5_000;
/** Supplies above this are treated as extra-high tension; common practice. */
const HIGH_TENSION_VOLTS = 400;
/** Ultraviolet begins below this wavelength. */
const ULTRAVIOLET_METRES = 400e-9;

interface CautionRule {
  words: RegExp;
  /** Also applies when the quantity of this role goes past the limit on the draw. */
  role?: { names: readonly string[]; past: (value: number) => boolean };
  text: string;
}

const PD_ROLES = ['acceleratingPd', 'platePd', 'balancePd'];

const RULES: readonly CautionRule[] = [
  {
    words: /extra-high[- ]tension|high[- ]tension supply/i,
    role: { names: PD_ROLES, past: (volts) => volts > HIGH_TENSION_VOLTS },
    text: 'High-tension supply: it can kill. Use a supply limited to a safe current, shrouded leads, and switch off before touching the circuit.',
  },
  {
    words: /x-ray/i,
    role: { names: ['acceleratingPd'], past: (volts) => volts > X_RAY_VOLTS },
    text: 'A beam accelerated through more than about 5 kV makes X-rays where it stops. Keep below that or use a shielded tube.',
  },
  {
    words: /\bevacuated\b|\bvacuum\b|gas at low pressure|discharge tube/i,
    text: 'Evacuated glass can implode. Support the tube properly, keep it from knocks, and wear eye protection.',
  },
  {
    words: /ultraviolet/i,
    role: { names: ['wavelength'], past: (metres) => metres < ULTRAVIOLET_METRES },
    text: 'Ultraviolet radiation harms eyes and skin. Screen the lamp and never look at it.',
  },
  {
    words: /radioactive|ionising source|alpha source|beta source/i,
    text: 'Radioactive source: use handling tongs, keep it shielded and away from people, and record its use.',
  },
  {
    words: /\blaser\b/i,
    text: 'Laser light can damage eyes. Never look along the beam or at its reflection.',
  },
];

/**
 * The usual cautions for the apparatus that an item describes, judged by its words and by its values on the
 * draw; empty when none applies. The last line defers to local rules.
 */
export function cautionsFor(
  content: ItemContent,
  script: CompiledScript | null,
  values: DrawValues | null,
): string[] {
  const words = [content.title, content.stem, ...content.parts.map((part) => part.text)].join('\n');
  const known = new Set(script?.quantities.map((quantity) => quantity.name));
  const valuesOf = (roles: readonly string[]): number[] =>
    content.quantities.flatMap((quantity) => {
      const value = known.has(quantity.name) ? values?.values[quantity.name] : undefined;
      return quantity.role !== null && roles.includes(quantity.role) && typeof value === 'number'
        ? [value]
        : [];
    });
  const found = RULES.filter(
    ({ words: pattern, role }) =>
      pattern.test(words) || (role !== undefined && valuesOf(role.names).some((value) => role.past(value))),
  ).map((rule) => rule.text);
  return found.length === 0 ? [] : [...found, CAUTION_DEFERENCE];
}
