import { ASSUMPTIONS, CLAIMS, type ItemContent } from '#shared/engine/index.ts';

const ASSUMPTION_NAMES: Readonly<Record<(typeof ASSUMPTIONS)[number], string>> = {
  nonRelativistic: 'Relativity is left out',
  stokesLaw: 'Stokes’ law holds',
  noUpthrust: 'The upthrust of the air is left out',
  noSlipCorrection: 'The slip of air past small drops is left out',
  uniformField: 'The field is uniform',
  fromRest: 'Particles start from rest',
};
const CLAIM_NAMES: Readonly<Record<(typeof CLAIMS)[number], string>> = {
  beamClearsPlates: 'The beam leaves the plates without hitting them',
  electronsEmitted: 'Electrons are emitted',
  noElectronsEmitted: 'No electrons are emitted',
};

interface StatementsEditorProps {
  content: ItemContent;
  /** Cautions that the product knows for the apparatus named in the item. */
  cautions: readonly string[];
  readOnly: boolean;
  onChange: (change: Partial<ItemContent>, label: string) => void;
}

function toggled<Entry>(list: readonly Entry[], entry: Entry): Entry[] {
  return list.includes(entry) ? list.filter((one) => one !== entry) : [...list, entry];
}

/** What the stem states or claims, so that the checker knows; and whether it is practical work. */
export function StatementsEditor({ content, cautions, readOnly, onChange }: StatementsEditorProps) {
  return (
    <div className="grid gap-4">
      <fieldset>
        <legend className="field-label">The stem states that</legend>
        {ASSUMPTIONS.map((assumption) => (
          <label key={assumption} className="check">
            <input
              type="checkbox"
              checked={content.assumptions.includes(assumption)}
              disabled={readOnly}
              onChange={() =>
                onChange({ assumptions: toggled(content.assumptions, assumption) }, 'what the stem states')
              }
            />{' '}
            {ASSUMPTION_NAMES[assumption]}
          </label>
        ))}
      </fieldset>
      <fieldset>
        <legend className="field-label">The text claims, on every draw, that</legend>
        {CLAIMS.map((claim) => (
          <label key={claim} className="check">
            <input
              type="checkbox"
              checked={content.claims.includes(claim)}
              disabled={readOnly}
              onChange={() => onChange({ claims: toggled(content.claims, claim) }, 'what the text claims')}
            />{' '}
            {CLAIM_NAMES[claim]}
          </label>
        ))}
      </fieldset>
      <label className="check">
        <input
          type="checkbox"
          checked={content.practical}
          disabled={readOnly}
          onChange={(event) => onChange({ practical: event.target.checked }, 'practical work')}
        />{' '}
        Practical work: the usual cautions are printed with the item
      </label>
      {cautions.length > 0 && (
        <div>
          <p className="field-label">Cautions for this apparatus</p>
          <ul className="list-disc pl-5 text-sm">
            {cautions.map((caution) => (
              <li key={caution}>{caution}</li>
            ))}
          </ul>
        </div>
      )}
    </div>
  );
}
