/** What is found `async` has ten seconds to appear, not one: busy cores are no fault of a component. */
import { configure } from '@testing-library/react';

configure({ asyncUtilTimeout: 10_000 });
