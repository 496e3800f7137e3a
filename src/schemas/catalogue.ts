import type { z } from 'zod'
import { cutterProblems } from '@/core/catalogue/cutter-problems'
import type { GeometryProblem } from '@/core/catalogue/geometry-problem'
import { colletProblems, extensionProblems, holderProblems } from '@/core/catalogue/holding-problems'
import type { CatalogueKind } from '@/core/stock/kinds'
import type {
  ColletResponse,
  CreateColletRequest,
  colletListQuerySchema,
  UpdateColletRequest,
} from './collet'
import type {
  CreateCutterRequest,
  CutterResponse,
  cutterListQuerySchema,
  UpdateCutterRequest,
} from './cutter'
import type {
  CreateExtensionRequest,
  ExtensionResponse,
  extensionListQuerySchema,
  UpdateExtensionRequest,
} from './extension'
import type {
  CreateFixtureRequest,
  FixtureResponse,
  fixtureListQuerySchema,
  UpdateFixtureRequest,
} from './fixture'
import type {
  CreateHolderRequest,
  HolderResponse,
  holderListQuerySchema,
  UpdateHolderRequest,
} from './holder'

/** What is asked and answered of each kind of item that has geometry. */
export interface CatalogueTypes {
  cutter: {
    create: CreateCutterRequest
    update: UpdateCutterRequest
    row: CutterResponse
    query: z.output<typeof cutterListQuerySchema>
  }
  holder: {
    create: CreateHolderRequest
    update: UpdateHolderRequest
    row: HolderResponse
    query: z.output<typeof holderListQuerySchema>
  }
  collet: {
    create: CreateColletRequest
    update: UpdateColletRequest
    row: ColletResponse
    query: z.output<typeof colletListQuerySchema>
  }
  extension: {
    create: CreateExtensionRequest
    update: UpdateExtensionRequest
    row: ExtensionResponse
    query: z.output<typeof extensionListQuerySchema>
  }
  fixture: {
    create: CreateFixtureRequest
    update: UpdateFixtureRequest
    row: FixtureResponse
    query: z.output<typeof fixtureListQuerySchema>
  }
}

type ProblemsOf = { [Kind in CatalogueKind]: (item: CatalogueTypes[Kind]['create']) => GeometryProblem[] }

/** The rules of each kind, for a row as a whole. */
export const geometryProblemsOf: ProblemsOf = {
  cutter: cutterProblems,
  holder: holderProblems,
  collet: colletProblems,
  extension: extensionProblems,
  /** Its height has its range and no other rule. */
  fixture: () => [],
}
