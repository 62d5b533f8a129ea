import { useId, useState } from 'react';
import { Button } from './button';
import { classNames } from './class-names';
import { Dialog } from './dialog';
import { clashesOf, type VersionChoice, type VersionClash, type VersionField } from './merge-versions';

export interface ConflictDialogProps {
  /** What was edited by two people, as "This interpretation". */
  subject: string;
  fields: readonly VersionField[];
  /** Called with the keys of the fields in which the other version is taken. */
  onResolve: (takeTheirs: ReadonlySet<string>) => void;
  /** Goes on editing; nothing is saved and nothing is lost. */
  onClose: () => void;
  working?: boolean;
}

/** Two people changed the same row: both versions side by side, and a choice for each field. */
export function ConflictDialog({ subject, fields, onResolve, onClose, working }: ConflictDialogProps) {
  const clashes = clashesOf(fields);
  const [picked, setPicked] = useState<Record<string, VersionChoice>>({});
  const choiceOf = (clash: VersionClash) => picked[clash.key] ?? clash.choice;
  const resolve = () =>
    onResolve(new Set(clashes.filter((clash) => choiceOf(clash) === 'theirs').map((clash) => clash.key)));
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      width="wide"
      title="Changed by someone else"
      description={`${subject} was saved by someone else while you were writing. Choose what is kept; nothing is saved until you do.`}
      actions={
        <>
          <Button onClick={onClose}>Keep on editing</Button>
          <Button kind="main" loading={working ?? false} onClick={resolve}>
            Save what is chosen
          </Button>
        </>
      }
    >
      {clashes.length === 0 ? (
        <p>Both versions say the same.</p>
      ) : (
        <div className="flex flex-col gap-5">
          {clashes.map((clash) => (
            <ClashChoice
              key={clash.key}
              clash={clash}
              choice={choiceOf(clash)}
              onChoose={(choice) => setPicked({ ...picked, [clash.key]: choice })}
            />
          ))}
        </div>
      )}
    </Dialog>
  );
}

interface ClashChoiceProps {
  clash: VersionClash;
  choice: VersionChoice;
  onChoose: (choice: VersionChoice) => void;
}

function ClashChoice({ clash, choice, onChoose }: ClashChoiceProps) {
  const note = clash.isContested
    ? 'both changed it'
    : clash.mine === clash.base
      ? 'only they changed it'
      : 'only you changed it';
  return (
    <fieldset>
      <legend className="mb-1">
        <span className="font-semibold">{clash.label}</span> <span className="text-muted">{note}</span>
      </legend>
      <div className="grid gap-2 sm:grid-cols-2">
        <VersionText
          name={clash.key}
          label="Yours"
          text={clash.mine}
          chosen={choice === 'mine'}
          onChoose={() => onChoose('mine')}
        />
        <VersionText
          name={clash.key}
          label="Theirs"
          text={clash.theirs}
          chosen={choice === 'theirs'}
          onChoose={() => onChoose('theirs')}
        />
      </div>
    </fieldset>
  );
}

interface VersionTextProps {
  name: string;
  label: string;
  text: string;
  chosen: boolean;
  onChoose: () => void;
}

function VersionText({ name, label, text, chosen, onChoose }: VersionTextProps) {
  const id = useId();
  return (
    <div
      className={classNames(
        'flex items-start gap-2 rounded border px-3 py-2',
        chosen ? 'border-water bg-water-tint' : 'border-rule',
      )}
    >
      <input
        id={id}
        type="radio"
        name={`version of ${name}`}
        checked={chosen}
        onChange={onChoose}
        className="mt-0.5 size-4 shrink-0 cursor-pointer accent-water"
      />
      <label htmlFor={id} className="min-w-0 flex-1 cursor-pointer">
        <span className="block text-sm text-muted">{label}</span>
        <span className="block max-h-48 overflow-y-auto whitespace-pre-wrap">
          {text === '' ? 'empty' : text}
        </span>
      </label>
    </div>
  );
}
