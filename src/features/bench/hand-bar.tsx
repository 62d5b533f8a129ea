import { Redo2, Undo2 } from 'lucide-react';
import type { ReactNode } from 'react';
import { Button } from '../../ui/button';
import { IconButton } from '../../ui/icon-button';
import type { ModelHandle } from './use-model';

export interface HandBarProps {
  model: ModelHandle;
  /** Letter of the run the model can go back to; null where there is none. */
  runLetter: string | null;
  children?: ReactNode;
}

/** Where the model stands between the run and the hand, and the way back. */
export function HandBar({ model, runLetter, children }: HandBarProps) {
  return (
    <div className="flex flex-wrap items-center gap-x-2 gap-y-1">
      <h2 className="mr-auto font-semibold">
        Beds
        <span className="ml-3 text-sm font-normal text-muted">
          {model.hand ? model.handName : runLetter === null ? '' : `run ${runLetter}`}
        </span>
      </h2>
      {model.hand ? (
        <Button size="small" kind="quiet" onClick={model.takeUpRun}>
          {runLetter === null ? 'Clear the model' : `Back to run ${runLetter}`}
        </Button>
      ) : null}
      <IconButton
        label="Undo"
        icon={<Undo2 aria-hidden size={16} />}
        aria-disabled={!model.canUndo}
        onClick={model.undo}
      />
      <IconButton
        label="Redo"
        icon={<Redo2 aria-hidden size={16} />}
        aria-disabled={!model.canRedo}
        onClick={model.redo}
      />
      {children}
    </div>
  );
}
