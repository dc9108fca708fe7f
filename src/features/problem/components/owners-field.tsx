import type { UseFormRegisterReturn } from 'react-hook-form';
import type { Person } from '#shared/contracts/teams.ts';
import { Choice, ChoiceGroup } from '#src/components/choice-group.tsx';

interface OwnersFieldProps {
  readonly people: readonly Person[];
  readonly registration: UseFormRegisterReturn;
}

/** Who works on it; advisors advise and own nothing. */
export function OwnersField({ people, registration }: OwnersFieldProps) {
  return (
    <ChoiceGroup legend="Owners">
      {people
        .filter(({ role }) => role !== 'advisor')
        .map(({ id, name }) => (
          <Choice key={id} kind="checkbox" words={name} value={id} {...registration} />
        ))}
    </ChoiceGroup>
  );
}
