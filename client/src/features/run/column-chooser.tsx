import type { Column } from './row-columns.ts';

interface ColumnChooserProps {
  readonly all: readonly Column[];
  readonly shown: readonly Column[];
  readonly onChange: (keys: readonly string[] | null) => void;
}

/** Which columns stand in the table; opened where it is asked for, closed by Esc. */
export function ColumnChooser({ all, shown, onChange }: ColumnChooserProps) {
  const keys = shown.map(({ key }) => key);
  const turn = (key: Column['key']) =>
    onChange(
      keys.includes(key)
        ? keys.filter((one) => one !== key)
        : all.map((column) => column.key).filter((one) => one === key || keys.includes(one)),
    );
  return (
    <details
      className="relative text-sm print:hidden"
      onKeyDown={(event) => {
        if (event.key !== 'Escape') return;
        event.currentTarget.open = false;
        event.currentTarget.querySelector('summary')?.focus();
      }}
    >
      <summary className="px-1 py-0.5 underline decoration-concrete-edge hover:decoration-current">
        Columns
      </summary>
      <div className="absolute right-0 z-20 mt-1 grid w-60 gap-0.5 border border-ink bg-sheet p-3">
        {all.map(({ key, title }) => (
          <label key={key} className="flex min-h-6 items-center gap-2">
            <input
              type="checkbox"
              className="size-4 accent-steel-solid"
              checked={keys.includes(key)}
              disabled={keys.length === 1 && keys.includes(key)}
              onChange={() => turn(key)}
            />
            {title}
          </label>
        ))}
        <button
          type="button"
          className="mt-1 justify-self-start text-xs underline decoration-concrete-edge hover:decoration-current"
          onClick={() => onChange(null)}
        >
          The usual ones
        </button>
      </div>
    </details>
  );
}
