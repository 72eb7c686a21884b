import type { CampaignRole } from '../types/roles'

/** What a role does, in words that follow "as analyst:". */
export const roleDeeds: Record<CampaignRole, string> = {
  reader: 'reads, filters and exports, and changes nothing',
  observer: 'uploads spectra and submits retrievals of their own',
  analyst: 'also measures, reviews and accepts the results of others, and keeps stations and recipes',
  lead: 'also owns the campaign, its members and its releases',
}
