import { fieldId } from './paths';

/** Puts the focus into the first of these fields that stands, once what is about to be drawn is drawn. */
export function focusSoon(...paths: readonly string[]): void {
  requestAnimationFrame(() => {
    const field = paths
      .map((path) => document.getElementById(fieldId(path)))
      .find((element) => element !== null);
    field?.focus();
  });
}
