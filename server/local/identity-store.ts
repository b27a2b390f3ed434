import type { Adapter, AdapterPayload } from 'oidc-provider';

interface Kept {
  readonly payload: AdapterPayload;
  readonly until: number;
}

/** What the built-in identity service remembers, in memory: gone when it stops. */
export function createIdentityStore(now: () => number = Date.now): (model: string) => Adapter {
  const kept = new Map<string, Kept>();
  const grants = new Map<string, Set<string>>();
  const get = (key: string): AdapterPayload | undefined => {
    const found = kept.get(key);
    if (found && found.until > now()) return found.payload;
    kept.delete(key);
    return undefined;
  };
  const find = (model: string, fits: (payload: AdapterPayload) => boolean) =>
    [...kept.keys()].filter((key) => key.startsWith(`${model}:`)).map(get).find((payload) => payload !== undefined && fits(payload));
  return (model) => ({
    async upsert(id, payload, expiresIn) {
      const key = `${model}:${id}`;
      kept.set(key, { payload, until: expiresIn === undefined ? Number.POSITIVE_INFINITY : now() + expiresIn * 1000 });
      if (payload.grantId !== undefined) {
        const keys = grants.get(payload.grantId) ?? new Set<string>();
        grants.set(payload.grantId, keys.add(key));
      }
    },
    find: async (id) => get(`${model}:${id}`),
    findByUid: async (uid) => find(model, (payload) => payload.uid === uid),
    findByUserCode: async (userCode) => find(model, (payload) => payload.userCode === userCode),
    async consume(id) {
      const payload = get(`${model}:${id}`);
      if (payload) payload['consumed'] = Math.floor(now() / 1000);
    },
    async destroy(id) {
      kept.delete(`${model}:${id}`);
    },
    async revokeByGrantId(grantId) {
      for (const key of grants.get(grantId) ?? []) kept.delete(key);
      grants.delete(grantId);
    },
  });
}
