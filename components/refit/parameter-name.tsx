/** The name of a parameter; a constant's letter in the italic of the equations. */
export function ParameterName({ name }: { name: string }) {
  if (!name.startsWith('K ')) return name;
  return (
    <>
      <var className="symbol">K</var>
      {name.slice(1)}
    </>
  );
}
