import DxfParser from 'dxf-parser';
import { describe, expect, it } from 'vitest';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { MM_PER_IN } from '#shared/engine/units.ts';
import { sectionGeometry } from '#shared/drawing/section-geometry.ts';
import { DXF_LAYERS, sectionDxf } from '#client/src/drawing/section-dxf.ts';
import { sectionSvg } from '#client/src/drawing/section-svg.ts';
import { BASIS, NO_DEMAND, NO_RULES } from '../run/problem.ts';

const SECTION: SectionInput = {
  widthMm: 300,
  depthMm: 500,
  fcMPa: 30,
  fyMPa: 420,
  coverMm: 40,
  stirrup: { bar: '10', legs: 4, spacingMm: 150 },
  reinforcement: { kind: 'bars', tension: [{ bar: '25', count: 3 }], compression: [{ bar: '16', count: 2 }] },
};

function drawn(units: 'si' | 'us', section = SECTION) {
  const evaluation = evaluateSection(section, { basis: BASIS, demand: NO_DEMAND, rules: NO_RULES });
  return { section, geometry: sectionGeometry(section, evaluation, BASIS.barStandard), units };
}

/** Read back by a parser that is not the writer's. */
function readDxf(text: string) {
  const file = new DxfParser().parseSync(text)!;
  const on = (layer: keyof typeof DXF_LAYERS, type: string) =>
    file.entities.filter((entity) => entity.layer === DXF_LAYERS[layer].name && entity.type === type);
  return { file, on };
}

describe('the drawing as DXF', () => {
  it.each([
    ['si', 1, 4],
    ['us', MM_PER_IN, 1],
  ] as const)(
    'in %s has every bar, the concrete and the stirrup in their true places',
    (units, mmPerUnit, code) => {
      const plan = drawn(units);
      const { file, on } = readDxf(sectionDxf(plan, ['Candidate A']));
      expect(file.header['$INSUNITS']).toBe(code);
      const circles = on('bars', 'CIRCLE') as unknown as {
        center: { x: number; y: number };
        radius: number;
      }[];
      expect(
        circles.map(({ center, radius }) =>
          [center.x, -center.y, radius].map((v) => Number((v * mmPerUnit).toFixed(6))),
        ),
      ).toEqual(
        plan.geometry.bars.map(({ xMm, yMm, radiusMm }) =>
          [xMm, yMm, radiusMm].map((v) => Number(v.toFixed(6))),
        ),
      );
      const [concrete] = on('concrete', 'LWPOLYLINE') as unknown as {
        shape: boolean;
        vertices: { x: number; y: number }[];
      }[];
      const ends = (of: (vertex: { x: number; y: number }) => number) => {
        const values = concrete!.vertices.map((vertex) => of(vertex) * mmPerUnit);
        return Math.max(...values) - Math.min(...values);
      };
      expect(concrete!.shape).toBe(true);
      expect(ends(({ x }) => x)).toBeCloseTo(300, 6);
      expect(ends(({ y }) => y)).toBeCloseTo(500, 6);
      // Two edges, both edges of two inner legs, two ends of the hook.
      expect(on('stirrups', 'LWPOLYLINE')).toHaveLength(8);
      const edge = on('stirrups', 'LWPOLYLINE')[0] as unknown as { vertices: { x: number }[] };
      expect(Math.min(...edge.vertices.map(({ x }) => x)) * mmPerUnit).toBeCloseTo(40, 6);
    },
  );

  it('carries the dimensions of the page and the notes, in letters any reader takes', () => {
    const text = sectionDxf(drawn('si'), ['Meets the listed checks of ACI 318M-19 · f′c 30']);
    const { on } = readDxf(text);
    const words = (on('dimensions', 'TEXT') as unknown as { text: string }[]).map((label) => label.text);
    expect(words).toEqual(expect.arrayContaining(['h 500', 'b 300', 'cover 40', '3-25']));
    expect(on('notes', 'TEXT')).toHaveLength(1);
    expect(text).toContain('f\\U+2032c 30');
    expect(text).toMatch(/^[\x20-\x7e\r\n\t]*$/);
  });

  it('of plain layers and of a slab is a file too', () => {
    const layers = [{ depthMm: 440, areaMm2: 1500, face: 'tension' as const }];
    const plain = readDxf(
      sectionDxf(drawn('si', { ...SECTION, reinforcement: { kind: 'layers', layers } }), []),
    );
    expect(plain.on('bars', 'LWPOLYLINE')).toHaveLength(1);
    const flange = {
      shape: 't',
      thicknessMm: 120,
      face: 'compression',
      width: { kind: 'given', widthMm: 1500 },
    } as const;
    const slab = readDxf(sectionDxf(drawn('si', { ...SECTION, flange }), []));
    const [outline] = slab.on('concrete', 'LWPOLYLINE') as unknown as { vertices: unknown[] }[];
    expect(outline!.vertices.length).toBeGreaterThan(8);
  });
});

describe('the drawing as SVG', () => {
  it('stands by itself: every bar, no class, no style sheet, and what people typed as text', () => {
    const plan = drawn('us');
    const svg = sectionSvg(plan, ['<script>alert(1)</script> & "B1"']);
    expect(svg.match(/<circle /g)).toHaveLength(plan.geometry.bars.length);
    expect(svg).not.toMatch(/class=|var\(--/);
    expect(svg).toContain('&lt;script&gt;alert(1)&lt;/script&gt; &amp; &quot;B1&quot;');
    expect(svg).not.toContain('<script');
  });
});
