export const row = 1
