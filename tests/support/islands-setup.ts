/** Islands answer at once on a quiet machine; on a busy one the wait for them may be longer than a second. */
import { configure } from '@testing-library/react';

configure({ asyncUtilTimeout: 15_000 });
