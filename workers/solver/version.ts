/** Raised when any reference number moves by more than 1e-9. */
export const solverVersion = '1.0.0'
