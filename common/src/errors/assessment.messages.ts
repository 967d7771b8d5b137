export const assessmentMessages = {};
