/** Every address of the product. Nothing else writes an href. */
export const routes = {
  signIn: (next?: string) => (next ? `/sign-in?next=${encodeURIComponent(next)}` : '/sign-in'),
  today: () => '/',
  plantBook: (query = '') => `/plant-book${query}`,
  newMachine: () => '/plant-book/new',
  machine: (machineId: number) => `/machines/${machineId}`,
  machineEdit: (machineId: number) => `/machines/${machineId}/edit`,
  point: (pointId: number) => `/points/${pointId}`,
  reading: (recordId: number) => `/readings/${recordId}`,
  inTray: (query = '') => `/in-tray${query}`,
  newUpload: (query = '') => `/in-tray/new${query}`,
  upload: (uploadId: number) => `/in-tray/${uploadId}`,
  balanceJobs: () => '/balance-jobs',
  newBalanceJob: (machineId: number) => `/machines/${machineId}/new-balance-job`,
  balanceJob: (jobId: number) => `/balance-jobs/${jobId}`,
  jobRecord: (jobId: number) => `/balance-jobs/${jobId}/record`,
  dueBoard: (query = '') => `/due-board${query}`,
  workbench: () => '/workbench',
  settings: () => '/settings',
  people: () => '/settings/people',
  limitSets: () => '/settings/limit-sets',
  styleSheet: () => '/settings/style-sheet',
  api: {
    find: (text: string) => `/api/internal/find?text=${encodeURIComponent(text)}`,
    pointTrend: (pointId: number) => `/api/internal/points/${pointId}/trend`,
    waveform: (recordId: number, query = '') =>
      `/api/internal/readings/${recordId}/waveform${query}`,
    spectrum: (recordId: number, query = '') =>
      `/api/internal/readings/${recordId}/spectrum${query}`,
    uploadPreview: (uploadId: number) => `/api/internal/uploads/${uploadId}/preview`,
    file: (uploadId: number) => `/api/internal/uploads/${uploadId}/file`,
  },
} as const;
