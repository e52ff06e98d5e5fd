/** Changes whenever the same scene may get other numbers; stored beside every kept result. */
export const solverVersion = '1.0.0';
