/** A chapter of the main path takes 20 seconds on two idle cores and minutes on busy ones: it has three. */
jest.setTimeout(180_000);
