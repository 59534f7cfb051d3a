/**
 * A drawing as a file of its own, in the colours of the day: names of colours give way to the colour that stands beside
 * them, because programs outside the browser know no such names. Its spoken sentence becomes its title.
 */
export function savedSvg(drawing: SVGSVGElement): string {
  const copy = drawing.cloneNode(true) as SVGSVGElement;
  for (const element of [copy, ...copy.querySelectorAll("*")]) {
    element.removeAttribute("class");
    for (const { name, value } of [...element.attributes])
      if (value.includes("var(")) element.setAttribute(name, value.replace(NAMED, "$1"));
  }
  const sentence = copy.getAttribute("aria-label");
  if (sentence && !copy.querySelector(":scope > title")) {
    const title = document.createElementNS("http://www.w3.org/2000/svg", "title");
    title.textContent = sentence;
    copy.prepend(title);
  }
  return new XMLSerializer().serializeToString(copy);
}

/** `var(--ink, #1B2326)`, with the colour apart. */
const NAMED = /var\(--[\w-]+,\s*(#[0-9a-fA-F]{3,8})\)/g;
