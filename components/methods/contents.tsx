import { SECTIONS } from './sections';

/** The sections as a list of links, in the column beside the text. */
export function MethodsContents() {
  return (
    <nav aria-label="On this page" className="mt-6">
      <ol className="max-lg:columns-2 max-lg:gap-x-6">
        {SECTIONS.map(({ id, title }) => (
          <li key={id}>
            <a href={`#${id}`} className="block py-1 text-soft hover:text-ink hover:underline">
              {title}
            </a>
          </li>
        ))}
      </ol>
    </nav>
  );
}
