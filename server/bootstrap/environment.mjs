/** What the product's programs are told through the environment when nobody said otherwise. */

/**
 * The settings for migrate, seed and the server.
 * @param {import('./local-database.mjs').LocalDatabase | null} database our own, or null when DATABASE_URL names one
 * @returns {Record<string, string>}
 */
export function chosenEnvironment(database) {
  const given = process.env;
  return {
    PORT: given.PORT || '4200',
    HOST: given.HOST || '127.0.0.1',
    SILLSTONE_DEMO: given.SILLSTONE_DEMO || '1',
    ...(!database && given.DATABASE_OWNER_URL && { DATABASE_OWNER_URL: given.DATABASE_OWNER_URL }),
    ...(database && {
      DATABASE_URL: database.applicationUrl,
      DATABASE_OWNER_URL: database.ownerUrl,
      SESSION_SECRET: given.SESSION_SECRET || database.sessionSecret,
    }),
  };
}
