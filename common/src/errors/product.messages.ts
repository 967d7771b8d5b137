export const productMessages = {};
