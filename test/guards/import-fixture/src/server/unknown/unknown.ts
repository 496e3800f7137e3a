export const unknown = 1
