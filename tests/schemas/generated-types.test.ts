import { readFile } from 'node:fs/promises';
import { expect, expectTypeOf, it } from 'vitest';
import type { DatasetInput } from '@/lib/engine/inputs';
import {
  CONCENTRATION_UNITS,
  ENERGY_ORIENTATIONS,
  ENERGY_UNITS,
  MOLAR_UNITS,
  RATIO_ORIENTATIONS,
  TEMPERATURE_UNITS,
} from '@/lib/engine/units';
import type { DatasetDocument } from '@/schemas/dataset-1.generated';
import schema from '@/schemas/dataset-1.schema.json';
import { generateTypes } from '@/schemas/generate-types';

it('has the committed types as the schema asks for them, byte for byte', async () => {
  const committed = await readFile(new URL('../../schemas/dataset-1.generated.ts', import.meta.url), 'utf8');
  expect(await generateTypes()).toBe(committed);
});

it('describes documents that the engine takes as they stand', () => {
  expectTypeOf<DatasetDocument>().toExtend<DatasetInput>();
  const handOver = (document: DatasetDocument): DatasetInput => document;
  expect(handOver).toBeTypeOf('function');
});

it('knows the units and orientations of the engine', () => {
  const { $defs } = schema;
  expect($defs.concentrationUnit.enum).toEqual([...CONCENTRATION_UNITS]);
  expect($defs.molarUnit.enum).toEqual([...MOLAR_UNITS]);
  expect($defs.energyStatement.properties.unit.enum).toEqual([...ENERGY_UNITS]);
  expect($defs.energyStatement.properties.orientation.enum).toEqual([...ENERGY_ORIENTATIONS]);
  expect($defs.ratioStatement.properties.orientation.enum).toEqual([...RATIO_ORIENTATIONS]);
  expect($defs.temperature.properties.unit.enum).toEqual([...TEMPERATURE_UNITS]);
});

it('refuses unknown properties in every object and says what every property is', () => {
  const objects = collect(schema).filter(
    (node) => node.type === 'object' && 'properties' in node && 'description' in node,
  );
  expect(objects.length).toBeGreaterThan(20);
  for (const node of objects) {
    expect(node.additionalProperties).toBe(false);
    for (const property of Object.values(node.properties as Record<string, object>))
      expect('description' in property || '$ref' in property).toBe(true);
  }
});

function collect(node: unknown): Record<string, unknown>[] {
  if (typeof node !== 'object' || node === null) return [];
  return [node as Record<string, unknown>, ...Object.values(node).flatMap(collect)];
}
