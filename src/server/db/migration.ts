/** A step of the schema's history. Shipped steps never change; each may be run again after it broke half way. */
export interface Migration {
  readonly name: string;
  readonly statements: readonly string[];
}

const ASCII = 'CHARACTER SET ascii COLLATE ascii_nopad_bin';
/** Pieces of table definitions that every table repeats. */
export const sql = {
  id: 'id INT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY',
  publicId: `public_id CHAR(26) ${ASCII} NOT NULL`,
  stamps: 'created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3), updated_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3)',
  born: 'created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3)',
  /** Hashes and ids of other services: upper and lower case and blanks at the end matter. */
  outside: (length: number) => `VARCHAR(${length}) ${ASCII}`,
  hash: `CHAR(64) ${ASCII}`,
  money: (column: string) => `${column} BIGINT NOT NULL CHECK (${column} BETWEEN -9007199254740991 AND 9007199254740991)`,
  end: 'ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_520_ci',
} as const;
