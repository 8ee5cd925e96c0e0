import { describe, expect, it } from 'vitest';
import { beamInputSchema } from '#shared/contract/records.ts';
import { quantitiesInText } from '#shared/print/quantities-in-text.ts';

describe('quantities inside messages', () => {
  it('are printed in the units of a US project', () => {
    expect(quantitiesInText('Width b must be at least 50 mm', 'us')).toBe(
      'Width b must be at least 1.969 in',
    );
    expect(quantitiesInText('needs 1,016 mm and 420 MPa', 'us')).toBe('needs 40 in and 60.92 ksi');
  });

  it('stay as they are in an SI project', () => {
    expect(quantitiesInText('Width b must be at least 50 mm', 'si')).toBe('Width b must be at least 50 mm');
  });

  it('never speak of newton-millimetres, in either system', () => {
    expect(quantitiesInText('at most 1000000000000 N·mm', 'si')).toBe('at most 1,000,000 kN·m');
    expect(quantitiesInText('at most 1000000000 N', 'si')).toBe('at most 1,000,000 kN');
  });

  it('leave clauses, counts and other units alone', () => {
    const text = '3 bars in 2 layers, 22.2.2, 5 mm⁴, 12 Nm';
    expect(quantitiesInText(text, 'us')).toBe(text);
  });

  it('reach every limit the contract states for a beam', () => {
    const issues = beamInputSchema.safeParse({
      mark: 'B1',
      location: '',
      spanMm: 1e9,
      count: 1,
      muNmm: 1e13,
      vuN: 1e10,
      ductilityTarget: null,
      depthCapMm: 1e6,
    }).error!.issues;
    expect(issues).toHaveLength(4);
    for (const issue of issues) expect(quantitiesInText(issue.message, 'us')).toMatch(/ (in|kip·ft|kip)$/);
  });
});
