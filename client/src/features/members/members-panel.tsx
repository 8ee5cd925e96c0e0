import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Person, Project } from '#shared/contract/records.ts';
import { messageOf } from '#client/src/lib/api-error.ts';
import { useProject } from '#client/src/lib/project-context.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { roleLabel } from '#client/src/lib/state-labels.ts';
import { Button } from '#client/src/ui/button.tsx';
import { CheckboxField } from '#client/src/ui/checkbox-field.tsx';
import { EmptyState } from '#client/src/ui/empty-state.tsx';
import { ErrorState } from '#client/src/ui/error-state.tsx';
import { FormError } from '#client/src/ui/form-error.tsx';
import { Skeleton } from '#client/src/ui/skeleton.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { notify } from '#client/src/ui/toast.tsx';
import { useUnsavedGuard } from '#client/src/ui/use-unsaved-guard.tsx';
import { peopleQuery, useSetMembers } from './api.ts';

export function MembersPanel() {
  const project = useProject();
  return useMay('set-members') ? <MembersForm project={project} /> : <PeopleTable people={project.members} />;
}

function MembersForm({ project }: { readonly project: Project }) {
  const people = useQuery(peopleQuery());
  const save = useSetMembers(project.id);
  const saved = new Set(project.members.map((person) => person.id));
  const [chosen, setChosen] = useState<ReadonlySet<string>>(saved);
  const isDirty = chosen.size !== saved.size || [...chosen].some((id) => !saved.has(id));
  const guard = useUnsavedGuard(isDirty);

  if (people.isPending) return <Skeleton lines={6} className="max-w-3xl" />;
  if (people.isError)
    return (
      <ErrorState
        error={people.error}
        title="The people could not be loaded"
        onRetry={() => void people.refetch()}
      />
    );
  const toggle = (id: string) => {
    const next = new Set(chosen);
    if (!next.delete(id)) next.add(id);
    setChosen(next);
  };
  const submit = () =>
    save.mutate([...chosen], { onSuccess: () => notify.done('The project’s people are saved.') });
  return (
    <form
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <p className="mb-4 max-w-prose text-muted">
        Members see the project, each by the role they have in the office. The author of a candidate never
        checks or approves it, so a project needs an engineer and a checker.
      </p>
      <PeopleTable people={people.data} chosen={chosen} onToggle={toggle} />
      <div className="mt-5 flex flex-wrap items-center gap-4">
        <Button look="solid" type="submit" isBusy={save.isPending} disabled={!isDirty || chosen.size === 0}>
          Save people
        </Button>
        <FormError
          message={
            save.isError
              ? messageOf(save.error)
              : chosen.size === 0
                ? 'A project needs at least one member.'
                : null
          }
        />
      </div>
      {guard.element}
    </form>
  );
}

interface PeopleTableProps {
  readonly people: readonly Person[];
  readonly chosen?: ReadonlySet<string>;
  readonly onToggle?: (id: string) => void;
}

function PeopleTable({ people, chosen, onToggle }: PeopleTableProps) {
  if (people.length === 0) return <EmptyState title="Nobody is a member yet" />;
  return (
    <TableFrame label="People of the project" className="max-w-3xl">
      <thead>
        <tr>
          {chosen !== undefined && <th scope="col">Member</th>}
          <th scope="col">Name</th>
          <th scope="col">Role</th>
          <th scope="col">E-mail</th>
        </tr>
      </thead>
      <tbody>
        {people.map((person) => (
          <tr key={person.id} className="middle">
            {chosen !== undefined && (
              <td className="w-20">
                <CheckboxField
                  label={`${person.name} is a member`}
                  isLabelHidden
                  checked={chosen.has(person.id)}
                  onChange={() => onToggle?.(person.id)}
                />
              </td>
            )}
            <th scope="row" className="font-semibold whitespace-nowrap">
              {person.name}
            </th>
            <td>{roleLabel(person.role)}</td>
            <td className="text-muted">{person.email}</td>
          </tr>
        ))}
      </tbody>
    </TableFrame>
  );
}
