import { Sequelize } from 'sequelize';

const SQL_MODE = 'STRICT_TRANS_TABLES,ERROR_FOR_DIVISION_BY_ZERO,NO_ENGINE_SUBSTITUTION,ONLY_FULL_GROUP_BY';
const ACQUIRE_TIMEOUT_MS = 15_000;
const CONNECT_TIMEOUT_MS = 5_000;

/** The part of Sequelize's MariaDB query class that `repairRawResults` wraps. */
interface QueryPrototype {
  isRawQuery(): boolean;
  formatResults(data: unknown): unknown;
}

/** Opens a pool of connections whose sql_mode, time zone and character set are ours, whatever the server's are. */
export function connect(url: string, maxConnections = 12): Sequelize {
  const address = new URL(url);
  const sequelize = new Sequelize({
    dialect: 'mariadb',
    host: address.hostname.replace(/^\[|\]$/g, ''),
    port: address.port === '' ? 3306 : Number(address.port),
    username: decodeURIComponent(address.username),
    password: decodeURIComponent(address.password),
    database: decodeURIComponent(address.pathname.slice(1)),
    timezone: '+00:00',
    logging: false,
    define: { underscored: true },
    pool: { max: maxConnections, min: 0, acquire: ACQUIRE_TIMEOUT_MS, idle: 60_000 },
    dialectOptions: {
      charset: 'utf8mb4',
      collation: 'UTF8MB4_UNICODE_CI',
      connectTimeout: CONNECT_TIMEOUT_MS,
      initSql: `SET SESSION sql_mode = '${SQL_MODE}', tx_isolation = 'READ-COMMITTED'`,
      supportBigNumbers: false,
      insertIdAsNumber: true,
      bigIntAsNumber: true,
      decimalAsNumber: false,
      checkNumberRange: true,
    },
  });
  repairRawResults(sequelize);
  return sequelize;
}

// The connector marks `meta` as not configurable, and Sequelize 6 deletes it from every raw result.
function repairRawResults(sequelize: Sequelize): void {
  const dialect = (
    sequelize as unknown as { dialect: { Query: { prototype: QueryPrototype & { repaired?: true } } } }
  ).dialect;
  const prototype = dialect.Query.prototype;
  if (prototype.repaired) return;
  const original = prototype.formatResults;
  prototype.formatResults = function formatResults(data: unknown): unknown {
    if (!Array.isArray(data) || !this.isRawQuery()) return original.call(this, data);
    const rows = data as unknown[] & { meta?: unknown };
    return original.call(this, Object.assign([...rows], { meta: rows.meta }));
  };
  prototype.repaired = true;
}
