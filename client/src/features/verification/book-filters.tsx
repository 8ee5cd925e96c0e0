import { PROVENANCE_TEXT } from '#shared/verification/case-text.ts';
import { PROVENANCES } from '#shared/verification/published-case.ts';
import { TOPICS } from '#shared/verification/topics.ts';
import { Button } from '#client/src/ui/button.tsx';
import { SelectField } from '#client/src/ui/select-field.tsx';
import { TextField } from '#client/src/ui/text-field.tsx';
import type { BookFilter } from './filter-book.ts';

interface BookFiltersProps {
  readonly filter: BookFilter;
  /** Null or an empty text takes a filter away. */
  readonly onChange: (key: 'find' | 'topic' | 'provenance', text: string | null) => void;
  readonly onClear: () => void;
  /** What is left, e.g. `All 54 cases`. */
  readonly countText: string;
}

const topicOptions = [
  { value: '', label: 'All topics' },
  ...TOPICS.map(({ id, title }) => ({ value: id, label: title })),
];
const provenanceOptions = [
  { value: '', label: 'Any provenance' },
  ...PROVENANCES.map((value) => ({ value, label: PROVENANCE_TEXT[value] })),
];

export function BookFilters({ filter, onChange, onClear, countText }: BookFiltersProps) {
  const isFiltered = filter.find !== '' || filter.topicId !== null || filter.provenance !== null;
  return (
    <form
      role="search"
      aria-label="Cases"
      onSubmit={(event) => event.preventDefault()}
      className="flex flex-wrap items-end gap-x-6 gap-y-3 print:hidden"
    >
      <TextField
        label="Find"
        placeholder="source, case, word"
        className="w-full sm:w-56"
        value={filter.find}
        onChange={(event) => onChange('find', event.target.value)}
      />
      <SelectField
        label="Topic"
        className="w-full sm:w-64"
        options={topicOptions}
        value={filter.topicId ?? ''}
        onChange={(event) => onChange('topic', event.target.value)}
      />
      <SelectField
        label="Provenance"
        className="w-full sm:w-56"
        options={provenanceOptions}
        value={filter.provenance ?? ''}
        onChange={(event) => onChange('provenance', event.target.value)}
      />
      <p role="status" className="num py-1.5 text-sm">
        {countText}
      </p>
      {isFiltered && (
        <Button look="text" className="py-1.5" onClick={onClear}>
          Show all
        </Button>
      )}
    </form>
  );
}
