/**
 * Marks a form that holds typed text which is not saved: `<form {...unsaved(isDirty)}>`. The house asks before
 * such a form is left, by whatever way.
 */
export const unsaved = (holds: boolean): { 'data-unsaved'?: true } => (holds ? { 'data-unsaved': true } : {});

/** Whether anything within `place` holds text that is not saved. */
export const holdsUnsaved = (place: ParentNode): boolean => place.querySelector('[data-unsaved]') !== null;
