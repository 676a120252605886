/** Which fields of a form are on screen, so that a mistake elsewhere is not linked to nowhere. An external store for React. */
export class FieldsOnScreen {
  private names: readonly string[] = [];
  private readonly listeners = new Set<() => void>();

  readonly subscribe = (listener: () => void) => {
    this.listeners.add(listener);
    return () => void this.listeners.delete(listener);
  };

  readonly snapshot = () => this.names;

  /** Notes that a field is there; the answer notes that it has gone. */
  readonly enter = (name: string) => {
    this.change([...this.names, name]);
    return () => this.change(without(this.names, name));
  };

  private change(names: readonly string[]) {
    this.names = names;
    for (const listener of this.listeners) listener();
  }
}

/* Boxes of one group share a name: one leaving is not all leaving. */
function without(names: readonly string[], name: string): readonly string[] {
  const index = names.indexOf(name);
  return index < 0 ? names : names.toSpliced(index, 1);
}
