export const scheduleMessages = {};
