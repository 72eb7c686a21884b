import type * as z from 'zod'
import type { CampaignAction, Who } from '#shared/types/roles'

export type ApiMethod = 'get' | 'post' | 'patch' | 'put' | 'delete'

export interface ApiAnswer {
  description: string
  schema?: z.ZodType
  /** Media type; application/json when not said. */
  type?: string
}

/** One route as the OpenAPI document describes it, from the schemas that the route itself validates with. */
export interface ApiRoute {
  method: ApiMethod
  /** With {braces} for parameters. */
  path: string
  summary: string
  area: string
  access: 'public' | 'read' | 'submit'
  /** Who may do it, in the words of the table of rights. */
  who: Who
  /** Where `who` is about one's own: who may do it with what others submitted. */
  whoForOthers?: CampaignAction
  params?: z.ZodType
  query?: z.ZodType
  body?: z.ZodType
  /** A body that is not only JSON: schema by media type. */
  bodies?: Record<string, z.ZodType>
  headers?: { name: string, description: string, required?: boolean }[]
  answers: Record<number, ApiAnswer>
  /** Error statuses beyond those that every route of its access can give. */
  errors?: number[]
}
