import path from 'node:path'
import { dataFolder } from './project.mjs'

/**
 * The database to work with: the one that DATABASE_URL names, else the project's own cluster, started if need be.
 *
 * @param {(line: string) => void} [say]
 * @returns {Promise<{ own: boolean, env: Record<string, string>, description: string, release: () => Promise<boolean> }>}
 *   `env` for the process that uses it; `release` answers whether a cluster was stopped
 */
export async function openDatabase(say) {
  const PRATIQUE_DATA = dataFolder()
  const given = process.env.DATABASE_URL
  if (given)
    return {
      own: false,
      env: { DATABASE_URL: given, PRATIQUE_DATA, PRATIQUE_OWN_CLUSTER: '0' },
      description: 'the one DATABASE_URL names',
      release: async () => false,
    }
  const { Cluster } = await import('./postgres.mjs')
  const cluster = new Cluster({ folder: path.join(PRATIQUE_DATA, 'pg'), say })
  await cluster.start()
  return {
    own: true,
    env: { DATABASE_URL: cluster.url(), PRATIQUE_DATA, PRATIQUE_OWN_CLUSTER: '1' },
    description: `PostgreSQL on 127.0.0.1:${cluster.port}, data in ${cluster.folder}`,
    release: () => cluster.stop(),
  }
}
