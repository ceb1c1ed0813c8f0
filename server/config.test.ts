import { existsSync, mkdtempSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { ConfigError, readConfig } from '#server/config.ts';

const dataDir = mkdtempSync(join(tmpdir(), 'barwright-config-'));
afterAll(() => rmSync(dataDir, { recursive: true, force: true }));

const PRODUCTION = {
  DATA_DIR: dataDir,
  BARWRIGHT_SECRET: 'a-secret-of-thirty-two-characters-or-more',
  PUBLIC_URL: 'https://bars.shop.example/',
  SMTP_URL: 'smtp://post.shop.example:587',
  MAIL_FROM: 'Bars <bars@shop.example>',
  DEMO: 'off',
};

function faultsOf(environment: NodeJS.ProcessEnv): readonly string[] {
  try {
    readConfig(environment);
  } catch (error) {
    if (error instanceof ConfigError) return error.faults;
    throw error;
  }
  return [];
}

describe('readConfig', () => {
  it('without switches is a local trial with a secret of its own, kept for the owner only', () => {
    const config = readConfig({ DATA_DIR: dataDir });
    expect(config).toMatchObject({
      trial: true,
      demo: true,
      port: 4310,
      publicUrl: 'http://localhost:4310',
      smtpUrl: null,
    });
    expect(statSync(join(dataDir, 'secret')).mode & 0o777).toBe(0o600);
    expect(config.secret.length).toBeGreaterThanOrEqual(32);
    expect(readConfig({ DATA_DIR: dataDir }).secret).toBe(config.secret);
  });

  it('takes an empty setting as not given', () => {
    expect(readConfig({ DATA_DIR: dataDir, PUBLIC_URL: '', PORT: '' })).toMatchObject({
      trial: true,
      port: 4310,
    });
  });

  it('in production makes no secret and loads no demo shop', () => {
    const fresh = join(dataDir, 'fresh');
    const config = readConfig({ ...PRODUCTION, DATA_DIR: fresh });
    expect(config).toMatchObject({ trial: false, demo: false, publicUrl: 'https://bars.shop.example' });
    expect(config.secret).toBe(PRODUCTION.BARWRIGHT_SECRET);
    expect(existsSync(fresh)).toBe(false);
  });

  it.each(['BARWRIGHT_SECRET', 'PUBLIC_URL', 'SMTP_URL', 'MAIL_FROM'])(
    'one production switch, %s, makes all of them wanted, each named at once',
    (name) => {
      const faults = faultsOf({
        DATA_DIR: dataDir,
        [name]: PRODUCTION[name as keyof typeof PRODUCTION],
      }).join('\n');
      for (const other of ['BARWRIGHT_SECRET', 'PUBLIC_URL', 'SMTP_URL', 'MAIL_FROM'])
        if (other === name) expect(faults).not.toContain(`${other} is missing`);
        else expect(faults).toContain(`${other} is missing`);
      expect(faults).toContain('DEMO must be off');
    },
  );

  it('wants the public address encrypted', () => {
    expect(faultsOf({ ...PRODUCTION, PUBLIC_URL: 'http://bars.shop.example' }).join()).toContain('https://');
    expect(faultsOf({ ...PRODUCTION, PUBLIC_URL: 'http://localhost.elsewhere.example' })).toHaveLength(1);
    expect(faultsOf({ ...PRODUCTION, PUBLIC_URL: 'http://localhost:8080' })).toEqual([]);
  });

  it('names every setting that cannot be read', () => {
    const faults = faultsOf({
      PORT: 'eighty',
      DEMO: 'maybe',
      LOG_LEVEL: 'loud',
      BARWRIGHT_SECRET: 'short',
      SMTP_URL: 'post.shop.example',
    }).join('\n');
    for (const name of ['PORT', 'DEMO', 'LOG_LEVEL', 'BARWRIGHT_SECRET', 'SMTP_URL'])
      expect(faults).toContain(name);
  });
});
