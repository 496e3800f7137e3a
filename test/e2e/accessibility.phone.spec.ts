import { phoneStates } from '../support/accessible-states'
import { testEveryState } from '../support/walk-states'

testEveryState(phoneStates)
