/** In place of fields for a part of a draft that the form has none for; the part stays as it is. */
export function OddShape({ what }: { what: string }) {
  return (
    <p className="border-warn border-t py-3 text-sm">
      {what}: what this draft holds here has another shape than the format’s. It is kept as it is; change it
      under “Document as JSON”.
    </p>
  );
}
