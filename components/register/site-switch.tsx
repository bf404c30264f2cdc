'use client';

export type SiteChoice = { id: number; name: string };

type SiteSwitchProps = {
  sites: readonly SiteChoice[];
  /** Null means all sites. */
  siteId: number | null;
  /** Receives `siteId`, empty for all sites. */
  action: (form: FormData) => void | Promise<void>;
};

/** Which site the lists show; a person with one site only reads its name. */
export function SiteSwitch({ sites, siteId, action }: SiteSwitchProps) {
  const [only] = sites;
  if (sites.length <= 1) return <span className="px-2">{only?.name ?? 'No site yet'}</span>;
  return (
    <form action={action}>
      <select
        key={siteId ?? ''}
        name="siteId"
        aria-label="Site"
        defaultValue={siteId ?? ''}
        onChange={(event) => event.currentTarget.form?.requestSubmit()}
        className="target max-w-40 cursor-pointer truncate rounded border border-transparent bg-sheet px-2 hover:border-edge"
      >
        <option value="">All sites</option>
        {sites.map((site) => (
          <option key={site.id} value={site.id}>
            {site.name}
          </option>
        ))}
      </select>
    </form>
  );
}
