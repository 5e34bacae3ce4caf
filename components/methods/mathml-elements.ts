import { createElement, Fragment, isValidElement, type ReactElement, type ReactNode } from 'react';
import temml from 'temml';

const TOKEN = /<(\/?)([a-z]+)([^>]*)>|([^<]+)/g;
const ATTRIBUTE = /([a-z-]+)="([^"]*)"/g;
const ENTITIES: Record<string, string> = { '&lt;': '<', '&gt;': '>', '&quot;': '"', '&amp;': '&' };

type Attributes = Record<string, string>;

interface OpenElement {
  tag: string;
  attributes: Attributes;
  children: ReactNode[];
}

/** Attributes of one tag. A `style` is left out, since the content policy forbids it; globals.css says what it said. */
function readAttributes(text: string): Attributes {
  const attributes: Attributes = {};
  for (const [, name, value] of text.matchAll(ATTRIBUTE)) {
    if (name && name !== 'style') attributes[name === 'class' ? 'className' : name] = value ?? '';
  }
  return attributes;
}

const decode = (text: string) =>
  text.replace(/&(?:lt|gt|quot|amp);/g, (entity) => ENTITIES[entity] ?? entity);

/** A single letter is a symbol and set in italic; names such as ln, and letters declared upright, are not. */
function isSymbol({ tag, attributes, children }: OpenElement): boolean {
  const [text] = children;
  return tag === 'mi' && !attributes.mathvariant && typeof text === 'string' && /^\p{L}$/u.test(text);
}

/** The class by which globals.css knows an element, where it needs one. */
function classOf(open: OpenElement): string | undefined {
  if (isSymbol(open)) return 'letter';
  return open.tag === 'mo' && open.children[0] === '\u2211' ? 'large' : open.attributes.className;
}

/**
 * A letter as the base of an index, without its depth: browsers that find no table of mathematical constants in
 * a face would hang the index of g lower than that of n.
 */
function withoutDepth(base: ReactNode): ReactNode {
  const isLetter = isValidElement<Attributes>(base) && base.props.className === 'letter';
  return isLetter ? createElement('mpadded', { depth: '0' }, base) : base;
}

function toElement(open: OpenElement): ReactElement {
  const { tag, attributes, children } = open;
  const [base, ...others] = children;
  const parts = tag === 'msub' || tag === 'msubsup' ? [withoutDepth(base), ...others] : children;
  return createElement(tag, { ...attributes, className: classOf(open) }, ...parts);
}

/**
 * An equation as MathML elements.
 *
 * @param tex TeX without anything that needs an inline style to look right (colours, boxes, rules)
 * @param display on a line of its own, or in running text
 */
export function mathmlElements(tex: string, display: boolean): ReactElement {
  const markup = temml.renderToString(tex, { displayMode: display, throwOnError: true });
  const root: OpenElement = { tag: '', attributes: {}, children: [] };
  const stack = [root];
  for (const [, closing, tag, attributes, text] of markup.matchAll(TOKEN)) {
    const open = stack.at(-1) ?? root;
    if (text) open.children.push(decode(text));
    else if (!closing && tag) stack.push({ tag, attributes: readAttributes(attributes ?? ''), children: [] });
    else stack.pop() && stack.at(-1)?.children.push(toElement(open));
  }
  return createElement(Fragment, null, ...root.children);
}
