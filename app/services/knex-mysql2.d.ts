declare module "knex/lib/dialects/mysql2/index.js" {
  import type { Knex } from "knex";

  const Client: typeof Knex.Client;
  export default Client;
}
