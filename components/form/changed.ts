/** Whether anything in a form stands other than as it came: typed or chosen before the page's script was there, say. */
export function isChanged(form: HTMLFormElement): boolean {
  return Array.from(form.elements).some((control) => {
    if (control instanceof HTMLInputElement) return control.value !== control.defaultValue;
    if (!(control instanceof HTMLSelectElement)) return false;
    const options = Array.from(control.options);
    const first = Math.max(
      options.findIndex(({ defaultSelected }) => defaultSelected),
      0,
    );
    return control.selectedIndex !== first;
  });
}
