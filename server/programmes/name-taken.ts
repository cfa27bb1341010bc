import { invalid } from '@shared/problem';

/** Another one carries this name already. */
export const nameTaken = () =>
  invalid([{ field: 'name', reason: 'taken', message: 'This name is taken.' }]);
