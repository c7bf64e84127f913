/** A press on a tool leaves the caret where it is. */
export const keepCaret = (event: { preventDefault: () => void }): void => event.preventDefault();
