import { cloneDatabase, type TestDatabase } from '@wetside/db/testing/clone';
import { KillCluster } from './cluster.js';
import { Drill } from './drill.js';
import { KillServer } from './server.js';

export interface KillSetting {
  /** The checkout. */
  root: string;
  /** The built server's folder. */
  folder: string;
  /** The server's port. */
  port: number;
  /** Where the cluster lies, a name under .local, and the first port to try for it. */
  cluster: { name: string; port: number };
}

/** A cluster, a database in it, a server and people who tick; all of it goes with `end`. */
export class KillGround {
  private constructor(
    readonly drill: Drill,
    readonly db: TestDatabase,
    readonly cluster: KillCluster,
    private readonly server: KillServer,
  ) {}

  static async open({ root, folder, port, cluster: wanted }: KillSetting): Promise<KillGround> {
    const cluster = await KillCluster.make(root, wanted.name, wanted.port);
    try {
      // Clones are made where these lead.
      Object.assign(process.env, await cluster.logins());
      const db = await cloneDatabase();
      const server = new KillServer(folder, {
        MODE: 'test',
        PORT: String(port),
        PUBLIC_ORIGIN: `http://localhost:${port}`,
        DATABASE_URL: db.appUrl,
        DATABASE_JOBS_URL: db.jobsUrl,
        DATABASE_POOL: '8',
        SESSION_SECRET: 'a secret that is only ever used under kills',
        SWEEP_S: '1',
        MAIL_GRACE_S: '3600',
      });
      const drill = await Drill.open({ cluster, server, db });
      return new KillGround(drill, db, cluster, server);
    } catch (error) {
      await cluster.destroy();
      throw error;
    }
  }

  async end(): Promise<void> {
    await this.server.kill();
    await this.cluster.destroy();
  }
}
