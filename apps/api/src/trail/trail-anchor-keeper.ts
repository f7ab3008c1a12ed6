/** Notes the heads of both chains at the start, every hour and at the stop. */
import type { Services } from '../http/services.ts';
import { writeAnchor } from './trail-anchors.ts';
import { firstHash } from './trail-chain.ts';
import { askOf } from './verify-ask.ts';
import { headOfChanges } from './verify-view.ts';

const everyMs = 3_600_000;

export interface AnchorKeeper {
  /** Notes the heads a last time. */
  readonly stop: () => Promise<void>;
}

/** Notes where the chains stand now. */
export const noteHeads = async (services: Services): Promise<void> => {
  const changes = (await headOfChanges(askOf(services.db))) ?? { seq: 0, hash: firstHash };
  writeAnchor(services.env.anchorFile, { at: services.now().toISOString(), changes, reads: services.accessLog.head });
};

export const keepAnchors = async (services: Services): Promise<AnchorKeeper> => {
  await noteHeads(services);
  const timer = setInterval(
    () =>
      void noteHeads(services).catch((error: unknown) =>
        services.log.error({ err: error }, 'the heads of the audit trail could not be noted'),
      ),
    everyMs,
  );
  return {
    stop: async () => {
      clearInterval(timer);
      await noteHeads(services);
    },
  };
};
