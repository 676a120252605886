/** A ref that takes the focus once, when its element appears: the press that led here is gone from the screen. */
export const takeFocus = (element: HTMLElement | null): void => element?.focus({ preventScroll: true });
