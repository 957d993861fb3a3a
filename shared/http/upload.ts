/**
 * Sent with every upload. A plain form of another site cannot send a header of its own, so a body in a
 * form's content type is read only with it (Fetch standard, CORS-safelisted content types).
 */
export const uploadHeader = 'x-upload'

/** The field of an upload that holds the picture. */
export const photoField = 'photo'

/** Bytes of a picture that is sent; a phone's photo is 2 to 8 MB. */
export const photoMaxBytes = 12 * 1024 * 1024

/** Kinds of picture that are taken, by their content. */
export const photoTypes = ['image/jpeg', 'image/png', 'image/webp'] as const
