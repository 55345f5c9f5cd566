import { draw } from './ink.ts';
import type { Mark } from './scene.ts';

/**
 * Draws the marks into a group of the page, in place of what it held. Thousands of marks take milliseconds this way; one
 * component part a mark would take a second. Texts are set as text, never read as markup.
 */
export function paint(group: SVGGElement, marks: readonly Mark[]): void {
  const drawn = document.createDocumentFragment();
  for (const mark of marks) {
    const { tag, attributes, text } = draw(mark);
    const element = document.createElementNS('http://www.w3.org/2000/svg', tag);
    for (const [name, value] of Object.entries(attributes)) element.setAttribute(name, String(value));
    if (text !== null) element.textContent = text;
    drawn.append(element);
  }
  group.replaceChildren(drawn);
}
