import { QueryTypes, type Sequelize } from 'sequelize';

export interface SignInRecord {
  readonly personId: string;
  readonly organisationId: string;
  readonly passwordHash: string | null;
}

/** The account behind an e-mail address, asked before any organisation is known. */
export async function findSignIn(
  sequelize: Sequelize,
  email: string,
): Promise<SignInRecord | undefined> {
  const [found] = await sequelize.query<SignInRecord>(
    `SELECT person_id AS "personId", organisation_id AS "organisationId",
       password_hash AS "passwordHash" FROM find_sign_in($1)`,
    { bind: [email], type: QueryTypes.SELECT },
  );
  return found;
}
