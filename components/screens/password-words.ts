/** What a new password needs, as a hint at its field. */
export const PASSWORD_HINT = '12 characters or more; a few words in a row are easiest to keep.';
