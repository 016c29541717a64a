import { ensureBuild } from '@/scripts/setup/build.mjs';
import { Crew } from '@/scripts/setup/crew.mjs';
import { openOwnStation } from '@/scripts/setup/own-station.mjs';
import { freePortForRun } from '@/scripts/setup/places.mjs';
import { prepareDatabase, serve } from '@/scripts/setup/station.mjs';

export interface OwnServer {
  url: string;
  stopDatabase(): Promise<void>;
  startDatabase(): Promise<void>;
  end(): Promise<void>;
}

/** A server with a database of its own, for a journey that does to them what the others could not bear. */
export async function startOwnServer(purpose: string): Promise<OwnServer> {
  const crew = new Crew();
  crew.onLoss = (member: { name: string }, how: string) => {
    throw new Error(`${member.name} ended by itself (${how})`);
  };
  try {
    const build = await ensureBuild();
    const port = await freePortForRun();
    const { cluster, env } = await openOwnStation(crew, { name: purpose, port, fleeting: true });
    await prepareDatabase(env, { demo: false });
    await serve(crew, { env, port, build, show: false });
    return {
      url: env.APP_URL,
      stopDatabase: () => cluster.stop('immediate'),
      startDatabase: async () => void (await cluster.start()),
      end: () => crew.end(),
    };
  } catch (error) {
    await crew.end();
    throw error;
  }
}
