/** Readings of the binding constants: exchanged between the states, or stated as association constants. */
import { inverseConstant } from './convert-statements';
import type { BindingInput, ConstantStatement, DatasetInput, ParametersInput, SeriesInput } from './inputs';
import { renameCorrelations, withParameters } from './reread-parameters';
import { constantInRange, LARGEST_RELATIVE_U } from './stated-ranges';

/** K_I and K_A exchanged in every site class; correlations go with the constants. */
export function swapConstants<S extends SeriesInput>(dataset: DatasetInput, series: S): S | null {
  const unitOf = new Map(dataset.ligands.map(({ id, unit }) => [id, unit]));
  const differs = ({ ligand, inactive, active }: BindingInput) => {
    const unit = unitOf.get(ligand) ?? 'M';
    return inverseConstant(inactive, unit) !== inverseConstant(active, unit);
  };
  const { siteClasses } = series.parameters;
  if (!siteClasses.some(({ binding }) => binding.some(differs))) return null;
  const other = new Map<string, string>();
  for (const { id, binding } of siteClasses) {
    for (const { ligand } of binding) {
      other.set(`${id}/${ligand}/inactive`, `${id}/${ligand}/active`);
      other.set(`${id}/${ligand}/active`, `${id}/${ligand}/inactive`);
    }
  }
  return withParameters(series, {
    ...renameCorrelations(series.parameters, (name) => [other.get(name) ?? name]),
    ...mapBindings(series.parameters, ({ inactive, active, ...rest }) => ({
      ...rest,
      inactive: active,
      active: inactive,
    })),
  });
}

/**
 * Every K → 1/K in its own unit, its relative uncertainty kept. What grows with an association constant falls
 * with the dissociation constant, so its correlations with other quantities change sign.
 */
export function readAsDissociation<S extends SeriesInput>(series: S): S | null {
  const { siteClasses, correlations } = series.parameters;
  const stated = siteClasses.flatMap(({ binding }) =>
    binding.flatMap(({ inactive, active }) => [inactive, active].filter((one) => one !== null)),
  );
  const changes = stated.some(({ value }) => value !== 1);
  if (!changes || !stated.every((constant) => constantInRange(inverted(constant)))) return null;
  const names = new Set(
    siteClasses.flatMap(({ id, binding }) =>
      binding.flatMap(({ ligand }) => [`${id}/${ligand}/inactive`, `${id}/${ligand}/active`]),
    ),
  );
  const turned = correlations?.map((one) =>
    names.has(one.a) === names.has(one.b) ? one : { ...one, r: one.r === 0 ? 0 : -one.r },
  );
  return withParameters(series, {
    ...(turned === undefined ? {} : { correlations: turned }),
    ...mapBindings(series.parameters, ({ inactive, active, ...rest }) => ({
      ...rest,
      inactive: inactive && inverted(inactive),
      active: active && inverted(active),
    })),
  });
}

function inverted(constant: ConstantStatement): ConstantStatement {
  const value = 1 / constant.value;
  if (constant.u === undefined) return { ...constant, value };
  // Rounding must not carry the largest relative uncertainty beyond itself.
  const relative = Math.min(constant.u / constant.value, LARGEST_RELATIVE_U);
  return { ...constant, value, u: relative * value };
}

function mapBindings(
  { siteClasses }: ParametersInput,
  change: (binding: BindingInput) => BindingInput,
): Pick<ParametersInput, 'siteClasses'> {
  return {
    siteClasses: siteClasses.map((siteClass) => ({
      ...siteClass,
      binding: siteClass.binding.map(change),
    })),
  };
}
