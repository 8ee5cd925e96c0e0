import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { Project } from '#shared/contract/records.ts';
import { readSectionForm } from '#client/src/features/evaluate-section/read-section-form.ts';
import { SectionForm } from '#client/src/features/evaluate-section/section-form.tsx';
import { firstSectionForm, sectionForm } from '#client/src/features/evaluate-section/section-form-values.ts';
import { BASIS } from '../run/problem.ts';
import { PROJECT as US_PROJECT } from '../sweep-form/office-project.ts';

afterEach(cleanup);

const PROJECT: Project = {
  ...US_PROJECT,
  designBasis: { ...BASIS, units: 'si', fyMPa: 420, fytMPa: 420, coverMm: 40 },
};
const EMPTY = firstSectionForm(PROJECT.designBasis);
const TYPED = {
  ...EMPTY,
  widthMm: 300,
  depthMm: 500,
  fcMPa: 30,
  tensionText: '3-25',
  compressionText: '2-16',
};

describe('a section read from its form', () => {
  it('takes bars as the trade writes them', () => {
    const reading = readSectionForm(TYPED);
    expect(reading.kind === 'complete' && reading.input.section.reinforcement).toEqual({
      kind: 'bars',
      tension: [{ bar: '25', count: 3 }],
      compression: [{ bar: '16', count: 2 }],
    });
  });

  it('is the same after a way through a form', () => {
    const reading = readSectionForm(TYPED);
    if (reading.kind === 'incomplete') throw new Error('incomplete');
    const { section, demand } = reading.input;
    expect(readSectionForm(sectionForm({ section, demand, maxLayers: 2 }, PROJECT.designBasis))).toEqual(
      reading,
    );
  });

  it.each([
    ['no bars', { tensionText: '' }, 'section.reinforcement.tension'],
    ['unreadable bars', { tensionText: 'three' }, 'section.reinforcement.tension'],
    ['two groups on one face', { tensionText: '3-25, 2-20' }, 'section.reinforcement.tension'],
    ['an empty width', { widthMm: null }, 'section.widthMm'],
    ['a negative moment', { muNmm: -1 }, 'demand.muNmm'],
  ])('reports %s at its field', (_, part, path) => {
    const reading = readSectionForm({ ...TYPED, ...part });
    expect(reading.kind === 'incomplete' && [...reading.errors.keys()]).toEqual([path]);
  });

  it('refuses a layer outside the section', () => {
    const layers = [{ depthMm: 600, areaMm2: 1000, face: 'tension' as const }];
    const reading = readSectionForm({ ...TYPED, steel: 'layers', layers });
    expect(
      reading.kind === 'incomplete' && reading.errors.get('section.reinforcement.layers.0.depthMm'),
    ).toMatch(/outside the section/);
  });
});

describe('the section form', () => {
  function show() {
    const onEvaluate = vi.fn();
    render(
      <SectionForm
        project={PROJECT}
        initial={EMPTY}
        isBusy={false}
        refusal={null}
        onEdit={vi.fn()}
        onEvaluate={onEvaluate}
      />,
    );
    return { onEvaluate, user: userEvent.setup() };
  }

  it('complains about nothing before it is asked, then about everything missing', async () => {
    const { user, onEvaluate } = show();
    expect(document.querySelector('[aria-invalid="true"]')).toBeNull();
    await user.click(screen.getByRole('button', { name: 'Evaluate' }));
    expect(onEvaluate).not.toHaveBeenCalled();
    expect(screen.getByText('Width b must be a number')).toBeTruthy();
    expect(screen.getByText('Enter the bottom bars, as 3-#8')).toBeTruthy();
  });

  it('sends layers exactly as printed on Enter', async () => {
    const { user, onEvaluate } = show();
    await user.type(screen.getByLabelText('Width b'), '300');
    await user.type(screen.getByLabelText('Depth h'), '500');
    await user.type(screen.getByLabelText('Concrete f′c'), '30');
    await user.click(screen.getByRole('radio', { name: 'Plain layers' }));
    await user.type(screen.getAllByLabelText('Depth from the top')[0]!, '437.5');
    await user.type(screen.getAllByLabelText('Area')[0]!, '1,472.6{Enter}');
    expect(onEvaluate).toHaveBeenCalledOnce();
    expect(onEvaluate.mock.calls[0]![0].section.reinforcement).toEqual({
      kind: 'layers',
      layers: [{ depthMm: 437.5, areaMm2: 1472.6, face: 'tension' }],
    });
  });
});
