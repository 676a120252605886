import { act, type ReactNode } from 'react';
import { createRoot, hydrateRoot, type Root } from 'react-dom/client';
import { renderToString } from 'react-dom/server';
import { afterEach } from 'vitest';

Object.assign(globalThis, { IS_REACT_ACT_ENVIRONMENT: true });
let roots: Root[] = [];

afterEach(() => {
  act(() => roots.forEach((root) => root.unmount()));
  roots = [];
  document.body.replaceChildren();
});

const place = () => document.body.appendChild(document.createElement('div'));

/** Puts a component on the page and answers with the element it stands in. */
export function show(node: ReactNode): HTMLElement {
  const at = place();
  const root = createRoot(at);
  roots.push(root);
  act(() => root.render(node));
  return at;
}

/** As `show`, but as the browser has it before any script: plain HTML. `wake` then brings the script. */
export function showWithoutScript(node: ReactNode): { at: HTMLElement; wake: () => Promise<void> } {
  const at = place();
  at.innerHTML = renderToString(node);
  const wake = () => act(async () => void roots.push(hydrateRoot(at, node)));
  return { at, wake };
}

/** The one element a selector finds; throws when it is not there. */
export function find<E extends Element>(at: ParentNode, selector: string, kind: new () => E): E {
  const element = at.querySelector(selector);
  if (element instanceof kind) return element;
  throw new Error(`no ${kind.name} at ${selector}`);
}

/** Types into a box as a person does, so that listeners notice. */
export async function type(box: HTMLInputElement, text: string): Promise<void> {
  const setter = Object.getOwnPropertyDescriptor(HTMLInputElement.prototype, 'value')?.set;
  await act(async () => {
    setter?.call(box, text);
    box.dispatchEvent(new Event('input', { bubbles: true }));
  });
}

/** Presses a button and waits for what follows. */
export async function press(button: HTMLButtonElement): Promise<void> {
  await act(async () => button.click());
}
