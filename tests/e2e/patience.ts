/** A chapter of the main path takes 20 seconds on two idle cores and minutes on busy ones: three minutes a test, not Jest's five seconds. */
jest.setTimeout(180_000);
