import { ConflictPanel } from '../../../components/conflict-panel';
import { ErrorPanel } from '../../../components/error-panel';
import type { FieldSave } from './use-field-save';

interface Props {
  write: FieldSave;
  onTheirs: () => void;
  onSaved: () => void;
}

/** What a form on the field shows after a refusal: a conflict to settle, or the problem itself. */
export function SaveAnswers({ write, onTheirs, onSaved }: Props) {
  const { conflict, problem, messages } = write;
  if (conflict) {
    return (
      <ConflictPanel
        what="this field"
        busy={write.saving}
        onTheirs={() => {
          conflict.takeTheirs();
          onTheirs();
        }}
        onMine={() => void conflict.keepMine().then((ok) => ok && onSaved())}
      />
    );
  }
  if (problem === null || Object.keys(messages).length > 0) return null;
  return <ErrorPanel error={problem} />;
}
