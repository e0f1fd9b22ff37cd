/** A page with WebAssembly on two busy cores takes seconds where a unit takes milliseconds: a minute a test, not Jest's five seconds. */
jest.setTimeout(60_000);
