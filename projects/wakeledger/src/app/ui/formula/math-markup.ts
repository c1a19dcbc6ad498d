const MATHML = 'http://www.w3.org/1998/Math/MathML';

/** The elements of MathML Core that a formula may use. */
const ELEMENTS = new Set(
  (
    'math mrow mi mn mo mtext mspace ms mfrac msqrt mroot mstyle merror mpadded mphantom msub msup msubsup munder ' +
    'mover munderover mmultiscripts mprescripts mtable mtr mtd'
  ).split(' '),
);
const ATTRIBUTES = new Set(
  'mathvariant stretchy fence separator form displaystyle scriptlevel linethickness accent accentunder lspace rspace width'.split(
    ' ',
  ),
);

/**
 * Builds a formula's elements from its text. Only MathML's own elements and a few attributes are made, whatever the
 * text holds; undefined where it is not well-formed.
 */
export function mathElement(markup: string, document: Document): Element | undefined {
  const wrapped = /^\s*<math[\s>]/.test(markup) ? markup : `<math>${markup}</math>`;
  const parsed = new DOMParser().parseFromString(wrapped, 'application/xml');
  if (parsed.getElementsByTagName('parsererror').length > 0) return undefined;
  return copy(parsed.documentElement, document);
}

function copy(source: Element, document: Document): Element | undefined {
  if (!ELEMENTS.has(source.localName)) return undefined;
  const element = document.createElementNS(MATHML, source.localName);
  for (const { name, value } of Array.from(source.attributes)) {
    if (ATTRIBUTES.has(name)) element.setAttribute(name, value);
  }
  for (const child of Array.from(source.childNodes)) {
    if (child.nodeType === child.TEXT_NODE) element.append(child.textContent ?? '');
    else if (child instanceof Element) {
      const inner = copy(child, document);
      if (inner) element.append(inner);
    }
  }
  return element;
}
