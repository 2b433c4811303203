/** Opens the browser's file chooser; null when nothing was chosen. Call it from a press, as browsers ask. */
export function pickFile(accept: string): Promise<File | null> {
  return new Promise((resolve) => {
    const input = document.createElement('input');
    input.type = 'file';
    input.accept = accept;
    input.addEventListener('change', () => resolve(input.files?.[0] ?? null));
    input.addEventListener('cancel', () => resolve(null));
    input.click();
  });
}

interface PickMany {
  readonly many: boolean;
  /** Opens the camera where the device has one. */
  readonly capture: boolean;
}

/** The same for several files; an empty list when nothing was chosen. */
export function pickFiles(accept: string, { many, capture }: PickMany): Promise<File[]> {
  return new Promise((resolve) => {
    const input = document.createElement('input');
    input.type = 'file';
    input.accept = accept;
    input.multiple = many;
    if (capture) input.setAttribute('capture', 'environment');
    input.addEventListener('change', () => resolve(Array.from(input.files ?? [])));
    input.addEventListener('cancel', () => resolve([]));
    input.click();
  });
}
