import { cleanup, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it } from 'vitest';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { Inspector } from '#client/src/features/inspector/inspector.tsx';
import { BASIS, NO_RULES } from '../run/problem.ts';

afterEach(cleanup);

/** The section of HAND-01 in the optimum cases: worked by hand, its areas and depths as printed. */
const HAND_01: SectionInput = {
  widthMm: 300,
  depthMm: 500,
  fcMPa: 30,
  fyMPa: 420,
  coverMm: 40,
  stirrup: { bar: '10', legs: 2, spacingMm: 150 },
  reinforcement: {
    kind: 'layers',
    layers: [
      { depthMm: 437.5, areaMm2: (3 * Math.PI * 25 ** 2) / 4, face: 'tension' },
      { depthMm: 58, areaMm2: (2 * Math.PI * 16 ** 2) / 4, face: 'compression' },
    ],
  },
};

function show(section: SectionInput, muNmm: number | null = null) {
  const demand = { muNmm, ductilityTarget: 4, depthCapMm: null };
  const evaluation = evaluateSection(section, { basis: BASIS, demand, rules: NO_RULES });
  render(
    <Inspector section={section} evaluation={evaluation} standard="iso" units="si" areWorkingLinesOpen />,
  );
  return { evaluation, user: userEvent.setup() };
}

/** The printed result beside a symbol of the working. */
function resultOf(symbol: string): string {
  const name = screen.getAllByText(symbol, { selector: 'span' }).find((node) => node.closest('ol') !== null)!;
  return within(name.closest('li')!).getAllByText(/./, { selector: 'p.num' })[0]!.textContent;
}

describe('a section under the glass', () => {
  it('prints the hand-worked example to its printed digits', async () => {
    const { user } = show(HAND_01);
    await user.click(screen.getByRole('radio', { name: '4' }));
    expect(resultOf('β1')).toBe('0.8357');
    expect(resultOf('c')).toBe('86.05 mm');
    expect(resultOf('a')).toBe('71.91 mm');
    expect(resultOf('φMn')).toBe('222.2 kN·m');
    expect(resultOf('kd')).toBe('144.2 mm');
    expect(resultOf('Icr')).toBe('1,304 ×10⁶ mm⁴');
    expect(resultOf('φy')).toBe('7.161 ×10⁻⁶/mm');
    expect(resultOf('μφ')).toMatch(/^4\.8[67]\d$/);
    await user.click(screen.getByRole('radio', { name: '5' }));
    expect(resultOf('Mn')).toBe('246.85 kN·m');
  });

  it('gives each check its clause, what is asked and what is there', () => {
    show(HAND_01, 200e6);
    const strength = screen.getByText('Strength', { selector: 'p' }).closest('li')!;
    expect(strength.textContent).toContain('ACI 318M-19');
    expect(strength.textContent).toContain('200 asked, 222 kN·m there');
    expect(strength.textContent).toContain('meets');
  });

  it('says which checks fail and why, and never that a section is safe', () => {
    show(HAND_01, 400e6);
    expect(screen.getByText(/Fails 1 of \d listed checks/)).toBeTruthy();
    expect(screen.getByText('φMn ≥ Mu')).toBeTruthy();
    expect(document.body.textContent).not.toMatch(/\bsafe\b/i);
  });

  it('never shows the ductility without its convention, and warns where the elastic picture is doubtful', () => {
    const { evaluation } = show(HAND_01);
    expect(document.body.textContent).toContain(evaluation.ductility!.definition);
    expect(screen.getByText(/At first yield the concrete carries/)).toBeTruthy();
  });

  it('lists what is not checked and defers to a licensed engineer', () => {
    const { evaluation } = show(HAND_01);
    for (const item of evaluation.notChecked) expect(document.body.textContent).toContain(item);
    expect(document.body.textContent).toContain('A licensed engineer');
  });

  it('shows bars that cannot be placed with the width they need', () => {
    show({
      ...HAND_01,
      widthMm: 216,
      reinforcement: { kind: 'bars', tension: [{ bar: '25', count: 12 }], compression: [] },
    });
    expect(screen.getByText('does not fit')).toBeTruthy();
    expect(screen.getByText(/b of 398\.3 mm would do/)).toBeTruthy();
  });

  it('names and describes its drawing', () => {
    show(HAND_01);
    const drawing = screen.getByRole('img', { name: /Section 300 × 500 mm/ });
    expect(drawing.querySelector('desc')!.textContent).toContain('neutral axis at 86.05 mm');
  });
});
