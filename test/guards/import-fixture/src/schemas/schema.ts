export const schema = 1
