import { useLocalSearchParams } from 'expo-router'
import { ReceiptScreen } from '@/components/receipts/ReceiptScreen'

export default function ReceiptRoute() {
  return <ReceiptScreen address={useLocalSearchParams()} />
}
