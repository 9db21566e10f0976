import { defineStore } from 'pinia'
import { ref } from 'vue'

/** Short words about what was done, one after the other, spoken politely. */
export const useNoticesStore = defineStore('notices', () => {
  const queue = ref<string[]>([])
  const tell = (text: string) => queue.value.push(text)
  return { queue, tell }
})
