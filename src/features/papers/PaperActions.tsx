import { useState } from 'react';

import type { Paper } from '#shared/contracts/papers.ts';
import { Dialog } from '#src/components/ui/Dialog.tsx';
import { unsaved } from '#src/components/ui/unsaved.ts';
import { sentenceOf } from '#src/lib/api.ts';
import { type PaperCalls, storedPaperOf } from './api.ts';

type Step = 'propose' | 'giveBack' | 'seal' | 'release';

const STEPS: Readonly<Record<Step, { name: string; title: string; explanation: string; confirm: string }>> = {
  propose: {
    name: 'Propose for sealing',
    title: 'Propose this paper',
    explanation:
      'A second setter or a moderator then confirms it. Until they do, it can be returned to assembling.',
    confirm: 'Propose',
  },
  giveBack: {
    name: 'Return to assembling',
    title: 'Return this paper to assembling',
    explanation: 'The paper can then be changed again.',
    confirm: 'Return it',
  },
  seal: {
    name: 'Confirm and seal',
    title: 'Confirm and seal this paper',
    explanation:
      'All values, revisions, bands and the data sheet are frozen and hashed. Nothing on the paper can change after this.',
    confirm: 'Seal it',
  },
  release: {
    name: 'Release',
    title: 'Release this paper',
    explanation: 'The paper is no longer confidential after this. It cannot be undone.',
    confirm: 'Release it',
  },
};

interface PaperActionsProps {
  paper: Paper;
  calls: PaperCalls;
  onChanged: (paper: Paper) => void;
}

/** The next steps in the life of a paper, each asked about before it is taken. */
export function PaperActions({ paper, calls, onChanged }: PaperActionsProps) {
  const [step, setStep] = useState<Step | null>(null);
  const [reason, setReason] = useState('');
  const [problem, setProblem] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const can = (ability: Paper['abilities'][number]) => paper.abilities.includes(ability);
  const steps: Step[] = [
    ...(paper.state === 'assembling' && can('paper.propose') ? (['propose'] as const) : []),
    ...(paper.state === 'proposed' && can('paper.return') ? (['giveBack'] as const) : []),
    ...(paper.state === 'proposed' && can('paper.seal') ? (['seal'] as const) : []),
    ...(paper.state === 'sealed' && can('paper.release') ? (['release'] as const) : []),
  ];
  const close = () => {
    setStep(null);
    setProblem(null);
    setReason('');
  };
  const take = async (taken: Step) => {
    setBusy(true);
    setProblem(null);
    try {
      onChanged(
        await (taken === 'giveBack' ? calls.giveBack(paper.version, reason) : calls[taken](paper.version)),
      );
      close();
    } catch (error) {
      const stored = storedPaperOf(error);
      if (stored === null) setProblem(sentenceOf(error));
      else {
        // Nobody takes a step on a paper that they have not seen.
        onChanged(stored);
        setProblem('Somebody else changed this paper meanwhile. Close this and look at it again first.');
      }
    } finally {
      setBusy(false);
    }
  };
  return (
    <>
      {steps.map((each) => (
        <button
          key={each}
          type="button"
          className={each === 'giveBack' ? 'button' : 'button button-primary'}
          onClick={() => setStep(each)}
        >
          {STEPS[each].name}
        </button>
      ))}
      {paper.state === 'proposed' && !can('paper.seal') && (
        <p className="text-sm text-muted">
          Proposed by {paper.proposedBy?.name}. A second setter or a moderator confirms it.
        </p>
      )}
      {step !== null && (
        <Dialog title={STEPS[step].title} description={STEPS[step].explanation} open onClose={close}>
          <form
            className="grid gap-4"
            {...unsaved(reason !== '' && !busy)}
            onSubmit={(event) => {
              event.preventDefault();
              void take(step);
            }}
          >
            {step === 'giveBack' && (
              <label>
                <span className="field-label">Why</span>
                <textarea
                  className="field autogrow w-full"
                  autoFocus
                  required
                  value={reason}
                  onChange={(event) => setReason(event.target.value)}
                />
              </label>
            )}
            {problem !== null && (
              <p role="alert" className="text-lead">
                {problem}
              </p>
            )}
            <button type="submit" className="button button-primary justify-self-start" disabled={busy}>
              {STEPS[step].confirm}
            </button>
          </form>
        </Dialog>
      )}
    </>
  );
}
