import { listStates, testListStates } from '../support/list-states'

testListStates(listStates)
