import { Validator } from '@seriousme/openapi-schema-validator';
import { describe, expect, it } from 'vitest';
import { describeApi } from '@/lib/serving/describe-api';

describe('the description of the API', () => {
  it('is valid OpenAPI 3.1', async () => {
    const validator = new Validator();
    const result = await validator.validate(JSON.parse(JSON.stringify(describeApi())));
    expect(result.errors ?? []).toEqual([]);
    expect(result.valid).toBe(true);
    expect(validator.version).toBe('3.1');
  });

  it('refers to nothing that it does not hold', () => {
    const description = JSON.parse(JSON.stringify(describeApi()));
    const references = [...JSON.stringify(description).matchAll(/"\$ref":"([^"]*)"/g)].map(
      (match) => match[1],
    );
    expect(references.length).toBeGreaterThan(20);
    for (const reference of new Set(references)) {
      const name = /^#\/components\/schemas\/(.+)$/.exec(reference ?? '')?.[1];
      expect(description.components.schemas, reference).toHaveProperty([name ?? '']);
    }
  });
});
