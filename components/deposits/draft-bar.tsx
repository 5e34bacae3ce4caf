import { actionStyle } from '@/components/ui/action-style';
import { Button } from '@/components/ui/button';
import { type DepositState, stateWords } from '@/lib/deposits/states';

interface DraftBarProps {
  state: DepositState;
  /** things to mend */
  errors: number;
  isDirty: boolean;
  isSaving: boolean;
  onSave: () => void;
}

/** Where the columns are rows: state, what is to be mended, and saving, always within reach under the header. */
export function DraftBar({ state, errors, isDirty, isSaving, onSave }: DraftBarProps) {
  return (
    <div className="stuck-under-header z-20 border-hairline border-b bg-ground lg:hidden">
      <div className="page-width flex min-h-11 items-center gap-x-4 text-sm">
        <p className="min-w-0 truncate">{isDirty ? 'not saved yet' : stateWords(state)}</p>
        <a
          href={errors > 0 ? '#to-mend' : '#submission'}
          className={actionStyle('text', 'ml-auto whitespace-nowrap')}
        >
          {errors > 0 ? `${errors} to mend` : 'Submit'}
          {errors > 0 ? <span className="sr-only"> before submitting</span> : null}
        </a>
        <Button
          disabled={!isDirty || isSaving}
          onClick={onSave}
          aria-label={isSaving ? undefined : 'Save the draft'}
        >
          {isSaving ? 'Saving …' : 'Save'}
        </Button>
      </div>
    </div>
  );
}
