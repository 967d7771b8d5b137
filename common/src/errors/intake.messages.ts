export const intakeMessages = {};
