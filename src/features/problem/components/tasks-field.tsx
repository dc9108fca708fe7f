import type { Task } from '#shared/contracts/teams.ts';
import { Field } from '#src/components/field.tsx';
import { Word } from '#src/components/word.tsx';

interface TasksFieldProps {
  readonly tasks: readonly Task[];
  readonly onChange: (tasks: Task[]) => void;
  /** Sentences beside the questions, by their place. */
  readonly errors?: readonly (string | undefined)[] | undefined;
  readonly isReadOnly?: boolean;
  readonly hint: string;
}

const MOST = 12;

/** What the task asks, one question a line; each is a claim that the report must come to. */
export function TasksField({ tasks, onChange, errors = [], isReadOnly = false, hint }: TasksFieldProps) {
  const add = () => onChange([...tasks, { id: crypto.randomUUID(), text: '' }]);
  return (
    <fieldset className="min-w-0">
      <legend className="text-xs font-[550] text-ink-2">What it asks</legend>
      <p className="mt-1 mb-3 text-xs text-ink-3">{hint}</p>
      <ol className="grid grid-cols-[minmax(0,1fr)] gap-3">
        {tasks.map(({ id, text }, index) => (
          <li key={id} className="flex items-start gap-3">
            <Field
              label={<span className="sr-only">Question {index + 1}</span>}
              frameClassName="min-w-0 flex-1"
              value={text}
              maxLength={400}
              readOnly={isReadOnly}
              error={errors[index]}
              onChange={(event) =>
                onChange(tasks.map((task) => (task.id === id ? { id, text: event.target.value } : task)))
              }
            />
            {!isReadOnly && (
              <Word
                className="mt-3.5 text-sm"
                aria-label={`Remove question ${index + 1}`}
                onClick={() => onChange(tasks.filter((task) => task.id !== id))}
              >
                Remove
              </Word>
            )}
          </li>
        ))}
      </ol>
      {!isReadOnly && tasks.length < MOST && (
        <Word className="mt-3 text-sm" onClick={add}>
          Add a question
        </Word>
      )}
    </fieldset>
  );
}
