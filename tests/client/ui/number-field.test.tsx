import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { afterEach, describe, expect, it } from 'vitest';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { NumberField } from '#client/src/ui/number-field.tsx';

afterEach(cleanup);

let stored: number | null = null;

function Width({ initial, units, error }: { initial: number | null; units: UnitSystem; error?: string }) {
  const [value, setValue] = useState(initial);
  stored = value;
  return (
    <>
      <NumberField
        label="Width b"
        kind="length"
        units={units}
        value={value}
        onChange={setValue}
        error={error}
      />
      <button onClick={() => setValue(508)}>set to 508 mm</button>
    </>
  );
}

const input = () => screen.getByLabelText<HTMLInputElement>('Width b');

describe('a number field', () => {
  it('shows the stored value in the project’s units and hands back SI', async () => {
    render(<Width initial={457.2} units="us" />);
    expect(input().value).toBe('18');
    await userEvent.clear(input());
    await userEvent.type(input(), '1,250.5');
    expect(stored).toBeCloseTo(1250.5 * 25.4, 9);
    expect(input().value).toBe('1,250.5');
  });

  it('keeps text that is not a number, says what is wrong and gives no value', async () => {
    render(<Width initial={300} units="si" />);
    await userEvent.clear(input());
    await userEvent.type(input(), '12,5');
    expect(input().value).toBe('12,5');
    expect(input().getAttribute('aria-invalid')).toBe('true');
    expect(screen.getByText('Write decimals with a point: 12.5')).toBeDefined();
    expect(stored).toBeNaN();
  });

  it('is empty for null, and gives null when emptied', async () => {
    render(<Width initial={null} units="si" />);
    expect(input().value).toBe('');
    await userEvent.type(input(), '4');
    await userEvent.clear(input());
    expect(stored).toBeNull();
  });

  it('does not rewrite what is being typed, e.g. zeros after the point', async () => {
    render(<Width initial={null} units="us" />);
    await userEvent.type(input(), '1.50');
    expect(input().value).toBe('1.50');
  });

  it('prints anew when the value changes from outside or the units change', async () => {
    const { rerender } = render(<Width initial={457.2} units="us" />);
    await userEvent.click(screen.getByText('set to 508 mm'));
    expect(input().value).toBe('20');
    rerender(<Width initial={457.2} units="si" />);
    expect(input().value).toBe('508');
  });

  it('states a limit of the contract in the reader’s units and ties it to the input', () => {
    render(<Width initial={10} units="us" error="Width b must be at least 50 mm" />);
    const message = screen.getByText('Width b must be at least 1.969 in');
    expect(input().getAttribute('aria-describedby')).toBe(message.parentElement!.id);
  });
});
