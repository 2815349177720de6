import { useState } from 'react';
import type { Decision } from '../../../shared/api/takes.ts';
import { Button } from '../../components/Button.tsx';
import { Dialog } from '../../components/Dialog.tsx';
import { ErrorNote } from '../../components/ErrorNote.tsx';
import { TextArea } from '../../components/TextArea.tsx';
import { sentenceOf } from '../../lib/ApiProblem.ts';

type Asked = Exclude<Decision['state'], 'cleared'>;

const WORDS: Record<Asked, { title: string; says: string; label: string; act: string; acting: string }> = {
  'another-pass': {
    title: 'Another pass',
    says: 'The animator sees your remark beside the take and in the feed.',
    label: 'What should the next take do?',
    act: 'Ask for another pass',
    acting: 'Asking…',
  },
  waived: {
    title: 'Waive what is off',
    says: 'The findings stay readable, and the take counts as through.',
    label: 'Why may it stay as it is?',
    act: 'Waive',
    acting: 'Waiving…',
  },
};

interface DecisionDialogProps {
  /** What is asked; null: closed. */
  asked: Asked | null;
  busy: boolean;
  error: unknown;
  onClose: () => void;
  onDecide: (state: Asked, remark: string) => void;
}

/** Asks for the remark that goes with another pass or a waiver. The words stay when it is closed by mistake. */
export function DecisionDialog({ asked, busy, error, onClose, onDecide }: DecisionDialogProps) {
  const [remark, setRemark] = useState('');
  const [missing, setMissing] = useState(false);
  if (!asked) return null;
  const words = WORDS[asked];
  const submit = () => {
    if (remark.trim().length === 0) return setMissing(true);
    onDecide(asked, remark.trim());
  };
  return (
    <Dialog
      open
      onClose={onClose}
      title={words.title}
      actions={
        <>
          <Button kind="quiet" onClick={onClose}>
            Not now
          </Button>
          <Button kind="primary" busy={busy && words.acting} onClick={submit}>
            {words.act}
          </Button>
        </>
      }
    >
      <p className="mb-3 text-graphite">{words.says}</p>
      <TextArea
        label={words.label}
        rows={4}
        maxLength={2000}
        value={remark}
        required
        error={missing ? 'Say in a sentence why, so that the animator knows what to do.' : undefined}
        onChange={(event) => {
          setRemark(event.target.value);
          setMissing(false);
        }}
        onKeyDown={(event) => event.key === 'Enter' && (event.ctrlKey || event.metaKey) && submit()}
      />
      {error != null && <ErrorNote className="mt-3">{sentenceOf(error)}</ErrorNote>}
    </Dialog>
  );
}
