/** Data as it may stand in an element of a page: nothing that a teacher wrote can end the element. */
export const jsonForPage = (data: unknown): string => JSON.stringify(data).replace(/[<>&\u2028\u2029]/g, (sign) => `\\u${sign.charCodeAt(0).toString(16).padStart(4, '0')}`);
