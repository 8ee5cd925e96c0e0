import { describe, expect, it } from 'vitest';
import { savedDesignBasisSchema, type ProjectDesignBasis } from '#shared/contract/design-basis.ts';
import { NATIONAL_FIELDS } from '#shared/print/national-fields.ts';
import {
  basisFormValues,
  usualBarStandard,
  withCode,
  withStandard,
} from '#client/src/features/design-basis/basis-form-values.ts';
import { RECOMMENDED_VALUES } from '#shared/engine/rules/national-values.ts';
import { RULE_SET_IDS, SEISMIC_SYSTEMS } from '#shared/engine/section.ts';
import { BASIS } from '../run/problem.ts';

const SI: ProjectDesignBasis = { ...BASIS, units: 'si', fyMPa: 420, fytMPa: 420, coverMm: 40 };

describe('a design basis as it is chosen', () => {
  it('spells out what an older basis leaves open, and nothing that was chosen', () => {
    expect(basisFormValues(SI)).toMatchObject({ seismicSystem: 'none', ductilityMeasure: 'closed' });
    expect(basisFormValues(SI)).not.toHaveProperty('skinBar');
    expect(basisFormValues({ ...SI, skinBar: '12' }).skinBar).toBe('12');
    expect(savedDesignBasisSchema.safeParse(basisFormValues(SI)).success).toBe(true);
  });

  it('takes the bars of the code along only while they are the code’s own', () => {
    const us = { ...SI, ruleSet: 'aci318-19', barStandard: 'astm' } as const;
    expect(withCode(us, 'en1992').barStandard).toBe('iso');
    expect(withCode({ ...us, barStandard: 'csa' }, 'en1992').barStandard).toBeUndefined();
    for (const code of RULE_SET_IDS) expect(withCode(us, code).ruleSet).toBe(code);
    expect(usualBarStandard('aci318-14')).toBe('astm');
  });

  it('never leaves a pair behind that the door refuses', () => {
    for (const from of RULE_SET_IDS)
      for (const seismicSystem of SEISMIC_SYSTEMS) {
        const before: ProjectDesignBasis = {
          ...SI,
          ruleSet: from,
          barStandard: usualBarStandard(from),
          seismicSystem,
          skinBar: from.startsWith('aci318-') ? '#4' : '12',
        };
        for (const to of RULE_SET_IDS) {
          if (to === from) continue;
          const after = { ...before, ...withCode(before, to) };
          expect(savedDesignBasisSchema.safeParse(after).error?.issues ?? []).toEqual([]);
        }
      }
  });

  it('drops a side bar that the other standard does not list, and keeps one that it does', () => {
    expect(withStandard({ ...SI, skinBar: '12' }, 'astm')).toEqual({ barStandard: 'astm', skinBar: null });
    expect(withStandard({ ...SI, skinBar: '12' }, 'iso')).toEqual({ barStandard: 'iso' });
    expect(withStandard({ ...SI, skinBar: null }, 'csa')).toEqual({ barStandard: 'csa' });
  });

  it('refuses a seismic system of another code at its field', () => {
    const wrong = { ...SI, ruleSet: 'en1992', seismicSystem: 'special' };
    expect(savedDesignBasisSchema.safeParse(wrong).error!.issues.map(({ path }) => path)).toEqual([
      ['seismicSystem'],
    ]);
  });

  it('has a field for every national value that is a number, each once', () => {
    const shown = NATIONAL_FIELDS.flatMap(({ fields }) => fields.map(({ name }) => name));
    const numbers = Object.entries(RECOMMENDED_VALUES).flatMap(([name, value]) =>
      typeof value === 'number' && name !== 'crackWidthMm' ? [name] : [],
    );
    expect(shown.toSorted()).toEqual(numbers.toSorted());
  });
});
