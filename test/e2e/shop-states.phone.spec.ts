import { shopStates } from '../support/shop-states'
import { testStatesOfRoles } from '../support/walk-role-states'

testStatesOfRoles(shopStates)
